import { signAsync, verifyAsync } from '@noble/ed25519'
import { createPrivateKey, sign, verify } from 'node:crypto'
import { describe, expect, test } from 'vitest'
import { ed25519Key } from '@/lib/platform/jws'

/** RFC 8032, section 7.1, "Test Vectors for Ed25519": TEST 1, TEST 2, TEST 3 and TEST SHA(abc). Secret key, public key, message and signature in hex. */
const VECTORS: readonly (readonly [name: string, secret: string, publicKey: string, message: string, signature: string])[] = [
  [
    'TEST 1',
    '9d61b19deffd5a60ba844af492ec2cc44449c5697b326919703bac031cae7f60',
    'd75a980182b10ab7d54bfed3c964073a0ee172f3daa62325af021a68f707511a',
    '',
    'e5564300c360ac729086e2cc806e828a84877f1eb8e5d974d873e065224901555fb8821590a33bacc61e39701cf9b46bd25bf5f0595bbe24655141438e7a100b',
  ],
  [
    'TEST 2',
    '4ccd089b28ff96da9db6c346ec114e0f5b8a319f35aba624da8cf6ed4fb8a6fb',
    '3d4017c3e843895a92b70aa74d1b7ebc9c982ccf2ec4968cc0cd55f12af4660c',
    '72',
    '92a009a9f0d4cab8720e820b5f642540a2b27b5416503f8fb3762223ebdb69da085ac1e43e15996e458f3613d0f11d8c387b2eaeb4302aeeb00d291612bb0c00',
  ],
  [
    'TEST 3',
    'c5aa8df43f9f837bedb7442f31dcb7b166d38535076f094b85ce3a2e0b4458f7',
    'fc51cd8e6218a1a38da47ed00230f0580816ed13ba3303ac5deb911548908025',
    'af82',
    '6291d657deec24024827e69c3abe01a30ce548a284743a445e3680d7db5ac3ac18ff9b538d16f290ae67f760984dc6594a7c15e9716ed28dc027beceea1ec40a',
  ],
  [
    'TEST SHA(abc)',
    '833fe62409237b9d62ec77587520911e9a759cec1d19755b7da901b96dca3d42',
    'ec172b93ad5e563bf4932c70e1245034c35467ef2efd4d64ebf819683467e2bf',
    'ddaf35a193617abacc417349ae20413112e6fa4e89a97ea20a9eeee64b55d39a2192992a274fc1a836ba3c23a3feebbd454d4423643ce80e2a9ac94fa54ca49f',
    'dc2a4459e7369633a52b1bf277839a00201009a3efbf3ecb69bea2186c26b58909351fc9ac90b3ecfdfbc7c66431e0303dca179c138ac17ad9bef1177331a704',
  ],
]

interface Verifier {
  readonly name: string
  readonly verify: (
    publicKey: Uint8Array<ArrayBuffer>,
    message: Uint8Array<ArrayBuffer>,
    signature: Uint8Array<ArrayBuffer>,
  ) => Promise<boolean>
}

/** Each that the product verifies with: the server, a browser with Ed25519 of its own, a browser without. */
const VERIFIERS: readonly Verifier[] = [
  {
    name: 'the server',
    verify: async (publicKey, message, signature) => {
      const key = ed25519Key(Buffer.from(publicKey).toString('base64url'))
      return key !== null && verify(null, message, key, signature)
    },
  },
  {
    name: 'WebCrypto',
    verify: async (publicKey, message, signature) => {
      const key = await crypto.subtle.importKey('raw', publicKey, 'Ed25519', false, ['verify'])
      return crypto.subtle.verify('Ed25519', key, signature, message)
    },
  },
  { name: 'the software verifier', verify: (publicKey, message, signature) => verifyAsync(signature, message, publicKey) },
]

describe.each(VECTORS)('RFC 8032, section 7.1, %s', (_, secret, publicKey, message, signature) => {
  test.each(VERIFIERS)('verifies by $name, and not with a bit of it turned over', async (by) => {
    const [key, text, good] = [bytes(publicKey), bytes(message), bytes(signature)]
    expect(await by.verify(key, text, good)).toBe(true)
    expect(await by.verify(key, Uint8Array.of(...text, 0), good)).toBe(false)
    for (const at of [0, 31, 32]) {
      const bad = good.slice()
      bad[at] = (bad[at] ?? 0) ^ 1
      expect(await by.verify(key, text, bad).catch(() => false)).toBe(false)
    }
  })

  test('is what node:crypto signs', () => {
    const key = createPrivateKey({
      key: { kty: 'OKP', crv: 'Ed25519', d: base64url(secret), x: base64url(publicKey) },
      format: 'jwk',
    })
    expect(sign(null, bytes(message), key).toString('hex')).toBe(signature)
  })

  test('is what the software key signs', async () => {
    expect(Buffer.from(await signAsync(bytes(message), bytes(secret))).toString('hex')).toBe(signature)
  })
})

function bytes(hex: string): Uint8Array<ArrayBuffer> {
  return new Uint8Array(Buffer.from(hex, 'hex'))
}

function base64url(hex: string): string {
  return Buffer.from(hex, 'hex').toString('base64url')
}
