import { addDays, civilDate, dayNumber } from '@/lib/rules/civil-date'
import { decodeBase32, encodeBase32 } from './base32'
import { packBase40, unpackBase40 } from './base40'
import type { PassPayload } from './pass-payload'

/*
 * Layout of the payload, big-endian, 19 bytes:
 *   0      version (high four bits) and type (low four)
 *   1      kid
 *   2–3    event        4–5  counter        6–7  entry
 *   8–9    validFrom, days since 2020-01-01
 *   10     days (high three bits), flags (low five: conditions, passenger seat, printed ahead, two zero)
 *   11–14  number, base 40        15–18  plate tail, base 40
 * The version fixes the signature (Ed25519 over "pass-v1\0" ‖ payload): there is no algorithm field to lie in.
 */
const VERSION = 1
const TYPES = { pass: 1, band: 2 } as const
const DAY_ZERO = civilDate('2020-01-01')
const DOMAIN = new TextEncoder().encode('pass-v1\0')
export const PAYLOAD_BYTES = 19
export const SIGNATURE_BYTES = 64
/** Base32 characters of a token. */
export const TOKEN_LENGTH = 133

const FLAG_CONDITIONS = 0b10000
const FLAG_PASSENGER_SEAT = 0b01000
const FLAG_PRINTED_AHEAD = 0b00100
const FLAGS_RESERVED = 0b00011

export interface DecodedToken {
  readonly payload: PassPayload
  readonly payloadBytes: Uint8Array<ArrayBuffer>
  readonly signature: Uint8Array<ArrayBuffer>
}

export type TokenProblem =
  | 'not-base32'
  | 'wrong-length'
  | 'unknown-version'
  | 'unknown-type'
  | 'no-days'
  | 'reserved-flag'
  | 'impossible-number'
  | 'impossible-plate'
  | 'impossible-band'

/** Packs a payload. Throws on one that cannot be packed: it was made wrong (a counter of 70,000, a day before 2020). */
export function encodePayload(payload: PassPayload): Uint8Array<ArrayBuffer> {
  const since = dayNumber(civilDate(payload.validFrom)) - dayNumber(DAY_ZERO)
  requireRange('kid', payload.kid, 0, 255)
  requireRange('event', payload.event, 0, 65_535)
  requireRange('counter', payload.counter, 0, 65_535)
  requireRange('entry', payload.entry, 0, 65_535)
  requireRange('validFrom', since, 0, 65_535)
  requireRange('days', payload.days, 1, 7)
  if (payload.type === 'band' && !isBand(payload)) throw new Error('a band has a number, and no entry and no plate')
  const bytes = new Uint8Array(PAYLOAD_BYTES)
  const view = new DataView(bytes.buffer)
  view.setUint8(0, (VERSION << 4) | TYPES[payload.type])
  view.setUint8(1, payload.kid)
  view.setUint16(2, payload.event)
  view.setUint16(4, payload.counter)
  view.setUint16(6, payload.entry)
  view.setUint16(8, since)
  view.setUint8(10, (payload.days << 5) | flagsOf(payload))
  view.setUint32(11, packBase40(payload.number))
  view.setUint32(15, packBase40(payload.plateTail))
  return bytes
}

/** What is signed: the payload behind a fixed prefix, so that a signature made for anything else is never one for a pass. */
export function signedMessage(payloadBytes: Uint8Array): Uint8Array<ArrayBuffer> {
  const message = new Uint8Array(DOMAIN.length + payloadBytes.length)
  message.set(DOMAIN)
  message.set(payloadBytes, DOMAIN.length)
  return message
}

/** The token's text: 83 bytes in base32. */
export function encodeToken(payloadBytes: Uint8Array, signature: Uint8Array): string {
  if (payloadBytes.length !== PAYLOAD_BYTES || signature.length !== SIGNATURE_BYTES) throw new Error('a token is 19 and 64 bytes')
  const bytes = new Uint8Array(PAYLOAD_BYTES + SIGNATURE_BYTES)
  bytes.set(payloadBytes)
  bytes.set(signature, PAYLOAD_BYTES)
  return encodeBase32(bytes)
}

/** Reads a token's text. Whether its signature is good is another question (`verifyToken`). */
export function decodeToken(
  text: string,
): { readonly ok: true; readonly token: DecodedToken } | { readonly ok: false; readonly problem: TokenProblem } {
  if (text.length !== TOKEN_LENGTH) return { ok: false, problem: 'wrong-length' }
  const bytes = decodeBase32(text)
  if (!bytes) return { ok: false, problem: 'not-base32' }
  const payloadBytes = bytes.slice(0, PAYLOAD_BYTES)
  const payload = readPayload(payloadBytes)
  if (typeof payload === 'string') return { ok: false, problem: payload }
  return { ok: true, token: { payload, payloadBytes, signature: bytes.slice(PAYLOAD_BYTES) } }
}

function readPayload(bytes: Uint8Array<ArrayBuffer>): PassPayload | TokenProblem {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  const head = view.getUint8(0)
  if (head >>> 4 !== VERSION) return 'unknown-version'
  const type = (head & 15) === TYPES.pass ? 'pass' : (head & 15) === TYPES.band ? 'band' : null
  if (type === null) return 'unknown-type'
  const daysAndFlags = view.getUint8(10)
  const flags = daysAndFlags & 31
  if (flags & FLAGS_RESERVED) return 'reserved-flag'
  if (daysAndFlags >>> 5 === 0) return 'no-days'
  const number = unpackBase40(view.getUint32(11))
  const plateTail = unpackBase40(view.getUint32(15))
  if (number === null) return 'impossible-number'
  if (plateTail === null) return 'impossible-plate'
  const entry = view.getUint16(6)
  if (type === 'band' && !isBand({ entry, number, plateTail })) return 'impossible-band'
  return {
    type,
    kid: view.getUint8(1),
    event: view.getUint16(2),
    counter: view.getUint16(4),
    entry,
    validFrom: addDays(DAY_ZERO, view.getUint16(8)),
    days: daysAndFlags >>> 5,
    conditions: (flags & FLAG_CONDITIONS) !== 0,
    passengerSeatUsable: (flags & FLAG_PASSENGER_SEAT) !== 0,
    printedAhead: (flags & FLAG_PRINTED_AHEAD) !== 0,
    number,
    plateTail,
  }
}

function isBand({ entry, number, plateTail }: Pick<PassPayload, 'entry' | 'number' | 'plateTail'>): boolean {
  return entry === 0 && plateTail === '' && number !== ''
}

function flagsOf(payload: PassPayload): number {
  return (
    (payload.conditions ? FLAG_CONDITIONS : 0) |
    (payload.passengerSeatUsable ? FLAG_PASSENGER_SEAT : 0) |
    (payload.printedAhead ? FLAG_PRINTED_AHEAD : 0)
  )
}

function requireRange(name: string, value: number, least: number, most: number): void {
  if (!Number.isInteger(value) || value < least || value > most) throw new Error(`${name} must be ${least} to ${most}, was ${value}`)
}
