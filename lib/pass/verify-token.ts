import { signedMessage, type DecodedToken } from './token'

/** Checks an Ed25519 signature (RFC 8032); handed in, because browser and server have their own. */
export type VerifySignature = (
  publicKey: Uint8Array<ArrayBuffer>,
  message: Uint8Array<ArrayBuffer>,
  signature: Uint8Array<ArrayBuffer>,
) => Promise<boolean>

/** Whether the token was signed by this key. A verifier that fails counts as *no*. */
export async function verifyToken(token: DecodedToken, publicKey: Uint8Array<ArrayBuffer>, verify: VerifySignature): Promise<boolean> {
  try {
    return await verify(publicKey, signedMessage(token.payloadBytes), token.signature)
  } catch {
    // A key that is none, a browser that cannot: nothing was proven, so it is not good.
    return false
  }
}
