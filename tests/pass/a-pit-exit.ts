import { verifyAsync } from '@noble/ed25519'
import { generateKeyPairSync, sign, type KeyObject } from 'node:crypto'
import { decideAtPitExit } from '@/lib/pass/decide-at-pit-exit'
import type { ListedEntry, ListedPass, ListedPerson, PassList } from '@/lib/pass/pass-list'
import { passId, type PassPayload } from '@/lib/pass/pass-payload'
import type { PitAnswer } from '@/lib/pass/pit-answer'
import { readScan, type PitAsk } from '@/lib/pass/pit-ask'
import type { PitDevice } from '@/lib/pass/pit-device'
import { qrText } from '@/lib/pass/qr-text'
import { encodePayload, encodeToken, signedMessage } from '@/lib/pass/token'
import { typedCode } from '@/lib/pass/typed-code'
import type { VerifySignature } from '@/lib/pass/verify-token'

export const SATURDAY = '2026-05-09'
export const SUNDAY = '2026-05-10'
/** Sat 9 May 2026, 09:40 at the venue. */
export const NOW = Date.parse('2026-05-09T09:40:00+01:00')
export const MINUTE = 60_000
export const ORIGIN = 'https://paddock.example'

/** The tablet in the bay: device 3 of event 12. */
export const BAY = generateKeyPairSync('ed25519')

/** Checks signatures as a browser without Ed25519 of its own does. */
export const verify: VerifySignature = (key, message, signature) => verifyAsync(signature, message, key)

export function publicKeyOf(key: KeyObject): string {
  return key.export({ format: 'jwk' }).x as string
}

export function aPayload(given: Partial<PassPayload> = {}): PassPayload {
  return {
    type: 'pass',
    kid: 3,
    event: 12,
    counter: 1,
    entry: 5,
    validFrom: SATURDAY,
    days: 1,
    conditions: false,
    passengerSeatUsable: true,
    printedAhead: false,
    number: '47',
    plateTail: '90VGN',
    ...given,
  }
}

export function aToken(given: Partial<PassPayload> = {}, key: KeyObject = BAY.privateKey): string {
  const bytes = encodePayload(aPayload(given))
  return encodeToken(bytes, new Uint8Array(sign(null, signedMessage(bytes), key)))
}

/** The line of the list for the pass that `aToken` of the same payload makes. */
export function aPass(given: Partial<ListedPass> = {}, payload: Partial<PassPayload> = {}): ListedPass {
  const { validFrom, days, passengerSeatUsable } = aPayload(payload)
  return {
    id: passId(aPayload(payload)),
    typedCode: typedCode(aToken(payload)),
    state: 'live',
    why: '',
    validFrom,
    days,
    conditions: [],
    passengerSeatUsable,
    ...given,
  }
}

export function aPerson(given: Partial<ListedPerson> = {}): ListedPerson {
  return { person: 'ana', name: 'Ana Brand', role: 'driver', bandNumber: '112', band: 'live', why: '', fit: 'not-asked', ...given }
}

export const BEN = aPerson({ person: 'ben', name: 'Ben Oduya', bandNumber: '113' })

/** Entry 5, number 47: passed, with a live pass on the list and one driver with a live band. */
export function anEntry(given: Partial<ListedEntry> = {}): ListedEntry {
  return {
    entry: 'entry-5',
    code: 5,
    number: '47',
    plate: 'GF90 VGN',
    plateTail: '90VGN',
    colour: 'red',
    model: 'Corvane S2',
    group: 'group-a',
    groupName: 'A',
    verdict: 'passed',
    blocks: [],
    passes: [aPass()],
    people: [aPerson()],
    ...given,
  }
}

/** List 14, two minutes old, of car 47 and whatever else is given. */
export function aList(entries: readonly ListedEntry[] = [anEntry()], given: Partial<PassList> = {}): PassList {
  const keys = [{ kid: 3, publicKey: publicKeyOf(BAY.publicKey), mayIssue: true, state: 'active' }] as const
  return { seq: 200, version: 14, at: NOW - 2 * MINUTE, eventCode: 12, day: SATURDAY, entries, keys, ...given }
}

/** The marshal's phone: a fresh list, a sound clock, group A running, nothing heard on the radio. */
export function aDevice(given: Partial<PitDevice> = {}): PitDevice {
  return {
    now: NOW,
    day: SATURDAY,
    timeZone: 'Europe/London',
    clockWentBackwards: false,
    listStaleMinutes: 30,
    readBackAt: null,
    runningGroup: 'group-a',
    blocks: [],
    ...given,
  }
}

/** What the camera makes of a text, with the keys of this list. */
export async function scanned(text: string, list: PassList | null): Promise<PitAsk> {
  return { how: 'camera', scan: await readScan(text, list, verify) }
}

/** Scans a text at the pit exit. */
export async function scanText(text: string, list: PassList | null = aList(), device: PitDevice = aDevice()): Promise<PitAnswer> {
  return decideAtPitExit(await scanned(text, list), list, device)
}

/** Scans a sticker at the pit exit. */
export async function scan(token: string, list: PassList | null = aList(), device: PitDevice = aDevice()): Promise<PitAnswer> {
  return scanText(qrText(ORIGIN, token), list, device)
}
