import { base64url } from '../core/base64url'

/** A device's signing key as it lies in its store. `device`: WebCrypto's, which nobody can read out; `software`: where WebCrypto has no Ed25519 (rule M2). */
export type DeviceKey =
  | { readonly kind: 'device'; readonly privateKey: CryptoKey; readonly publicKey: string }
  | { readonly kind: 'software'; readonly secret: Uint8Array; readonly publicKey: string }

/** Makes the key on this device. The public half is raw Ed25519 in base64url; the private one never leaves. */
export async function makeDeviceKey(): Promise<DeviceKey> {
  try {
    const pair = await crypto.subtle.generateKey('Ed25519', false, ['sign', 'verify'])
    const raw = await crypto.subtle.exportKey('raw', pair.publicKey)
    return { kind: 'device', privateKey: pair.privateKey, publicKey: base64url(new Uint8Array(raw)) }
  } catch {
    // No Ed25519 in this browser's WebCrypto, whatever the error is called there; the device check says which key is in use.
    const { keygenAsync } = await import('@noble/ed25519')
    const { secretKey, publicKey } = await keygenAsync()
    return { kind: 'software', secret: secretKey, publicKey: base64url(publicKey) }
  }
}

/** The Ed25519 signature (64 bytes) over these bytes. */
export async function signWith(key: DeviceKey, bytes: Uint8Array<ArrayBuffer>): Promise<Uint8Array> {
  if (key.kind === 'device') return new Uint8Array(await crypto.subtle.sign('Ed25519', key.privateKey, bytes))
  const { signAsync } = await import('@noble/ed25519')
  return signAsync(bytes, key.secret)
}

/** A compact JWS of this payload (RFC 7515; `EdDSA`, RFC 8037), its `typ` as given and `kid` the device's id. */
export async function signJwsWith(key: DeviceKey, type: string, device: string, payload: object): Promise<string> {
  const encoder = new TextEncoder()
  const header = { alg: 'EdDSA', typ: type, kid: device }
  const input = `${base64url(encoder.encode(JSON.stringify(header)))}.${base64url(encoder.encode(JSON.stringify(payload)))}`
  return `${input}.${base64url(await signWith(key, encoder.encode(input)))}`
}
