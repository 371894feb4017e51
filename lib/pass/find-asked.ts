import { lookUpByNumber, lookUpByTypedCode } from './look-up'
import { livePasses } from './may-run'
import type { ListedEntry, ListedPass, PassList } from './pass-list'
import { passId } from './pass-payload'
import type { PitReason } from './pit-answer'
import type { PitAsk } from './pit-ask'
import type { PitFound } from './pit-found'
import { readTypedCode, typedCode, type TypedCodeProblem } from './typed-code'

type Scan = Extract<PitAsk, { how: 'camera' }>['scan']

/** The entry and pass asked about, or why there is none to speak of, which is HOLD (rules P2 and P7). */
export function findAsked(ask: PitAsk, list: PassList | null, day: string): PitFound | PitReason {
  switch (ask.how) {
    case 'camera':
      return findScanned(ask.scan, list)
    case 'number':
      return list === null ? NO_LIST : findNumber(ask.number, list, day)
    case 'typed':
      return list === null ? NO_LIST : findCode(ask.code, list)
    default:
      return { code: 'foreign-code', why: ['Nothing was asked that this device understands.'], todo: 'Scan the sticker again.' }
  }
}

/** Without a list no key is known, and an unknown key is HOLD. */
const NO_LIST: PitReason = {
  code: 'no-list',
  why: ['This device has no pass list: it cannot tell a good pass from another.'],
  todo: 'Load the day where there is signal; until then ask the bay by radio for each car.',
}

const TO_BAY = 'Send the car to the bay.'
const CALL_CHIEF = 'Keep the car here and call the chief scrutineer.'

function findNumber(number: string, list: PassList, day: string): PitFound | PitReason {
  const [entry, second] = lookUpByNumber(list, number)
  if (!entry) {
    const why = number.trim() === '' ? 'No number was keyed in.' : `No entry on list ${list.version} has the number keyed in.`
    return { code: 'unknown-number', why: [why], todo: 'Read the number again, or scan its sticker.' }
  }
  if (second)
    return {
      code: 'number-twice',
      why: [`Two entries on list ${list.version} have number ${entry.number}.`],
      todo: 'Scan the sticker, or type its code.',
    }
  return { list, entry, listed: passAskedByNumber(entry, day), scanned: null }
}

/** Of several the one that counts today; a dead one only where none lives, so that the marshal is told why. */
function passAskedByNumber(entry: ListedEntry, day: string): ListedPass | null {
  return livePasses(entry, day).at(-1) ?? entry.passes.findLast(({ state }) => state === 'live') ?? entry.passes.at(-1) ?? null
}

const MISTYPED: Readonly<Record<TypedCodeProblem, string>> = {
  'too-short': 'The code has eight signs; some are missing.',
  'too-long': 'The code has eight signs; there are too many.',
  'not-a-sign': 'A sign was typed that no code has.',
  'check-sign': 'A sign is wrong, or two are swapped.',
}

function findCode(text: string, list: PassList): PitFound | PitReason {
  const read = readTypedCode(text)
  if (!read.ok) return { code: 'mistyped-code', why: [MISTYPED[read.problem]], todo: 'Type the eight signs again as printed.' }
  const [found, second] = lookUpByTypedCode(list, read.code)
  if (!found)
    return {
      code: 'unknown-code',
      why: [`No pass on list ${list.version} has this code. A typed code proves nothing by itself.`],
      todo: 'Scan the sticker instead; if it cannot be scanned, send the car to the bay.',
    }
  if (second) return { code: 'code-twice', why: [`Two passes on list ${list.version} have this code.`], todo: 'Scan the sticker instead.' }
  return { list, entry: found.entry, listed: found.pass, scanned: null }
}

function findScanned(scan: Scan, list: PassList | null): PitFound | PitReason {
  if (scan.kind === 'foreign')
    return {
      code: 'foreign-code',
      why: [`Not a Lockwire sticker: ${scan.shownAs}. It was not opened.`],
      todo: 'Look for the event’s own sticker, or key in the number.',
    }
  if (scan.kind === 'damaged')
    return {
      code: 'damaged-code',
      why: ['The code is damaged or made wrong; it proves nothing.'],
      todo: 'Scan the other label, or key in the number or the code.',
    }
  if (list === null) return NO_LIST
  const { payload } = scan
  if (payload.type === 'band')
    return { code: 'band-scanned', why: [`This is band ${payload.number}, not a car’s sticker.`], todo: 'Scan the sticker on the car.' }
  const refused = whyNotBelieved(scan, list)
  if (refused) return refused
  const entry = list.entries.find(({ code }) => code === payload.entry)
  if (!entry)
    return {
      code: 'unknown-entry',
      why: [`Its entry is not on list ${list.version}: nobody can say who may drive it.`],
      todo: 'Pull the list and scan again; otherwise ask the bay.',
    }
  const id = passId(payload)
  const code = typedCode(scan.token)
  const holder = list.entries.find(({ passes }) => passes.some((pass) => pass.id === id))
  const listed = holder?.passes.find((pass) => pass.id === id) ?? null
  // Two codes with one number: one of them was made by a device that lost count or by somebody who has its key.
  if (listed && (holder !== entry || listed.typedCode !== code))
    return { code: 'pass-differs', why: [`The list knows another pass under this one’s number.`], todo: CALL_CHIEF }
  return { list, entry, listed, scanned: { payload, typedCode: code } }
}

/** Whether the code is one of this event, signed by a device that may issue. */
function whyNotBelieved(scan: Extract<Scan, { kind: 'token' }>, list: PassList): PitReason | null {
  if (scan.payload.event !== list.eventCode) return { code: 'wrong-event', why: ['This sticker is of another event.'], todo: TO_BAY }
  const key = list.keys.find(({ kid }) => kid === scan.payload.kid)
  if (!key)
    return {
      code: 'unknown-key',
      why: [`Issued by a device that list ${list.version} does not know.`],
      todo: 'Pull the list and scan again; otherwise ask the bay.',
    }
  if (!scan.signatureGood) return { code: 'bad-signature', why: ['The signature is not good: altered or forged.'], todo: CALL_CHIEF }
  if (!key.mayIssue) return { code: 'key-may-not-issue', why: ['Issued by a device that may not issue passes.'], todo: CALL_CHIEF }
  return null
}
