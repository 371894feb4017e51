import { verifyAsync } from '@noble/ed25519'
import { readQrText, qrText } from '@/lib/pass/qr-text'
import { decodeToken, encodePayload, encodeToken, signedMessage, type DecodedToken } from '@/lib/pass/token'
import { verifyToken, type VerifySignature } from '@/lib/pass/verify-token'
import { median, row } from './row'

const TOKENS = 300

const pair = await crypto.subtle.generateKey('Ed25519', true, ['sign', 'verify'])
const publicKey = new Uint8Array(await crypto.subtle.exportKey('raw', pair.publicKey))
const texts = await Promise.all(Array.from({ length: TOKENS }, (_, index) => aSticker(index + 1)))

const native: VerifySignature = async (key, message, signature) => {
  const imported = await crypto.subtle.importKey('raw', key, 'Ed25519', false, ['verify'])
  return crypto.subtle.verify('Ed25519', imported, signature, message)
}
const inScript: VerifySignature = (key, message, signature) => verifyAsync(signature, message, key)

const parse = await each((text) => Promise.resolve(read(text)))
const parseAndVerify = await each((text) => mustHold(verifyToken(read(text), publicKey, native)))
const tokens = texts.map(read)
const bare = await each((_, index) =>
  mustHold(crypto.subtle.verify('Ed25519', pair.publicKey, at(tokens, index).signature, signedMessage(at(tokens, index).payloadBytes))),
)
const fallback = await each((text) => mustHold(verifyToken(read(text), publicKey, inScript)))

row({ what: 'token: parse the QR text', value: micros(parse) })
row({ what: 'token: parse + verify (WebCrypto)', value: micros(parseAndVerify) })
row({ what: 'token: WebCrypto verify alone, key at hand', value: micros(bare) })
row({ what: 'token: parse + verify ÷ verify alone', value: (parseAndVerify / bare).toFixed(2) })
row({ what: 'token: parse + verify (noble, where WebCrypto lacks Ed25519)', value: micros(fallback) })

async function aSticker(counter: number): Promise<string> {
  const payload = encodePayload({
    type: 'pass', kid: 1, event: 1, counter, entry: counter, validFrom: '2026-05-09', days: 2, conditions: false, passengerSeatUsable: true,
    printedAhead: false, number: String(counter), plateTail: '90VGN',
  }) // prettier-ignore
  const signature = new Uint8Array(await crypto.subtle.sign('Ed25519', pair.privateKey, signedMessage(payload)))
  return qrText('https://paddock.example', encodeToken(payload, signature))
}

function read(text: string): DecodedToken {
  const qr = readQrText(text)
  const decoded = qr.kind === 'token' ? decodeToken(qr.token) : null
  if (!decoded?.ok) throw new Error('a sticker of this bench does not read')
  return decoded.token
}

/** A bench that measures refusals would be fast and worth nothing. */
async function mustHold(verified: Promise<boolean>): Promise<void> {
  if (!(await verified)) throw new Error('a good token was refused')
}

/** Median time of one, ms, over three rounds of all, one after the other, the first round being the warm-up. */
async function each(work: (text: string, index: number) => Promise<unknown>): Promise<number> {
  const times: number[] = []
  for (let round = 0; round < 3; round++) {
    for (const [index, text] of texts.entries()) {
      const began = performance.now()
      await work(text, index)
      if (round > 0) times.push(performance.now() - began)
    }
  }
  return median(times)
}

function at<T>(list: readonly T[], index: number): T {
  const found = list[index]
  if (found === undefined) throw new Error('past the end of the tokens')
  return found
}

function micros(ms: number): string {
  return `${(ms * 1000).toFixed(0)} µs`
}
