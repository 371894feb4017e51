import type { VerifySignature } from '@/lib/pass/verify-token'

const keys = new Map<string, Promise<CryptoKey>>()

/**
 * Checks an Ed25519 signature with the browser's own cryptography; where it has no Ed25519, with one that travels in the page. Needs no network
 * (rule P1): the second one is a chunk of this shell, which the worker keeps.
 */
export const verifyInBrowser: VerifySignature = async (publicKey, message, signature) => {
  try {
    return await crypto.subtle.verify('Ed25519', await importOnce(publicKey), signature, message)
  } catch {
    // No Ed25519 here, whatever the error is called; a key that is none fails below as well.
    const { verifyAsync } = await import('@noble/ed25519')
    // Strict (RFC 8032, 5.1.7): an encoding that is not the one and only is no signature.
    return verifyAsync(signature, message, publicKey, { zip215: false })
  }
}

/** A list has a dozen keys and hundreds of scans. */
async function importOnce(publicKey: Uint8Array<ArrayBuffer>): Promise<CryptoKey> {
  const name = publicKey.join(' ')
  const known = keys.get(name) ?? crypto.subtle.importKey('raw', publicKey, 'Ed25519', false, ['verify'])
  keys.set(name, known)
  return known
}
