import { addDays, civilDate } from '@/lib/rules/civil-date'
import { passNumber } from './plate-tail'
import type { ListedEntry, ListedPass, PassList } from './pass-list'
import { passId, type PassPayload } from './pass-payload'
import type { PitAnswer } from './pit-answer'
import type { PitAsk } from './pit-ask'
import type { PitDevice } from './pit-device'
import { peopleAboard } from './pit-people'
import { parseTypedCode } from './typed-code'

/** A list made this much after the device's clock says the clock is wrong, ms. */
const CLOCK_TOLERANCE_MS = 2 * 60_000

type Reason = Pick<PitAnswer, 'code' | 'todo'> & { readonly why: readonly string[] }

/** What was asked about: the entry, and its pass as the list has it or as the code says. */
interface Found {
  readonly entry: ListedEntry
  readonly listed: ListedPass | null
  readonly payload: PassPayload | null
}

/**
 * PASSED, HOLD or CHECK, with no network (rules P1 to P8): first whatever says HOLD, however old the list, then whatever says CHECK, and only
 * then PASSED. Total: it answers for any input, and what it cannot make sense of is HOLD.
 */
export function decideAtPitExit(ask: PitAsk, list: PassList | null, device: PitDevice): PitAnswer {
  const found = find(ask, list)
  if ('code' in found) return toAnswer('HOLD', found, null)
  if (list === null) return toAnswer('HOLD', NO_LIST, null)
  const hold = firstHold(found, list, device)
  if (hold) return toAnswer('HOLD', hold, found)
  const doubts = doubtsAbout(found, list, device)
  const [first] = doubts
  if (first) return toAnswer('CHECK', { ...first, why: doubts.flatMap(({ why }) => why) }, found)
  return toAnswer('PASSED', { code: 'passed', why: [], todo: 'Compare number, plate, colour and model; then let it go.' }, found)
}

const NO_LIST: Reason = {
  code: 'no-list',
  why: ['This device has no pass list.'],
  todo: 'Load the day where there is signal, or ask the bay by radio.',
}

function find(ask: PitAsk, list: PassList | null): Found | Reason {
  if (ask.how === 'camera') return findScanned(ask.scan, list)
  if (list === null) return NO_LIST
  if (ask.how === 'number') {
    const number = ask.number.trim().toUpperCase()
    const entry = list.entries.find((one) => one.number.toUpperCase() === number)
    if (!entry)
      return {
        code: 'unknown-number',
        why: [`No entry has number ${number || '(none)'} on list ${list.version}.`],
        todo: 'Read the number again, or scan its sticker.',
      }
    return { entry, listed: passOfToday(entry), payload: null }
  }
  const code = parseTypedCode(ask.code)
  if (code === null)
    return {
      code: 'mistyped-code',
      why: ['That is not a code of ours: a sign is wrong, missing or swapped.'],
      todo: 'Type the eight signs again as printed.',
    }
  for (const entry of list.entries) {
    const listed = entry.passes.find((pass) => pass.typedCode === code)
    if (listed) return { entry, listed, payload: null }
  }
  return {
    code: 'unknown-code',
    why: [`No pass on list ${list.version} has this code.`],
    todo: 'Scan the sticker instead; if there is none, send the car to the bay.',
  }
}

function findScanned(scan: Extract<PitAsk, { how: 'camera' }>['scan'], list: PassList | null): Found | Reason {
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
      todo: 'Scan the other label, or key in number or code.',
    }
  if (list === null) return NO_LIST
  const { payload } = scan
  if (payload.type === 'band')
    return { code: 'band-scanned', why: [`This is band ${payload.number}, not a car’s sticker.`], todo: 'Scan the sticker on the car.' }
  if (payload.event !== list.eventCode)
    return { code: 'wrong-event', why: ['This sticker is of another event.'], todo: 'Send the car to the bay.' }
  const key = list.keys.find(({ kid }) => kid === payload.kid)
  if (!key)
    return {
      code: 'unknown-key',
      why: ['Issued by a device this list does not know.'],
      todo: 'Pull the list and scan again; otherwise ask the bay.',
    }
  if (!key.mayIssue)
    return {
      code: 'key-may-not-issue',
      why: ['Issued by a device that may not issue passes.'],
      todo: 'Keep the car here and call the chief scrutineer.',
    }
  if (!scan.signatureGood)
    return {
      code: 'bad-signature',
      why: ['The signature is not good: altered or forged.'],
      todo: 'Keep the car here and call the chief scrutineer.',
    }
  const entry = list.entries.find(({ code }) => code === payload.entry)
  if (!entry)
    return {
      code: 'unknown-entry',
      why: [`Entry not on list ${list.version}: nobody can say who may drive it.`],
      todo: 'Pull the list and scan again; otherwise ask the bay.',
    }
  return { entry, listed: entry.passes.find(({ id }) => id === passId(payload)) ?? null, payload }
}

/** P2, in its order. */
function firstHold({ entry, listed, payload }: Found, list: PassList, device: PitDevice): Reason | null {
  const valid = payload ?? listed
  if (valid && !isValidOn(valid, device.day))
    return { code: 'wrong-day', why: [`This pass is for ${daysOf(valid)}; today is ${device.day}.`], todo: 'Send the car to the bay.' }
  if (listed?.state === 'dead')
    return {
      code: 'dead-pass',
      why: [`This pass is dead: ${listed.why}.`, ...blockLines(entry)],
      todo: 'Send it to the bay. Take the old sticker off.',
    }
  if (listed?.state === 'quarantined')
    return {
      code: 'quarantined-pass',
      why: ['Issued without the right to issue; it counts for nothing.'],
      todo: 'Send the car to the bay.',
    }
  if (listed?.state === 'printed-ahead' || (payload?.printedAhead && !listed))
    return { code: 'not-alive', why: ['Printed ahead, and the car has not been passed since.'], todo: 'Send the car to the bay.' }
  if (payload && (payload.number !== passNumber(entry.number) || payload.plateTail !== entry.plateTail))
    return {
      code: 'number-differs',
      why: [`The sticker says ${payload.number} …${payload.plateTail}, the entry is ${entry.number} …${entry.plateTail}.`],
      todo: 'Send the car to the bay.',
    }
  const local = device.blocks.filter((block) => block.entry === entry.entry || block.number === entry.number)
  if (entry.blocks.length > 0 || local.length > 0 || ['withdrawn', 'held', 'not passed'].includes(entry.verdict))
    return {
      code: 'blocked',
      why: [...local.map(({ words }) => words), ...blockLines(entry), ...bareVerdict(entry, local.length)],
      todo: todoForBlocked(entry),
    }
  if (!listed && !payload)
    return { code: 'no-live-pass', why: [`No live pass for ${list.day}: ${entry.verdict}.`], todo: 'Send the car to the bay.' }
  if (listed && entry.verdict !== 'passed' && entry.verdict !== 'passed with advisories')
    return { code: 'verdict', why: [`The car reads ${entry.verdict}.`], todo: 'Send the car to the bay.' }
  const people = peopleAboard(entry)
  if (!people.some(({ drives, may }) => drives && may))
    return {
      code: 'nobody-may-drive',
      why: people.length === 0 ? ['No driver is named for this car.'] : people.map(({ name, why }) => `${name}: ${why}`),
      todo: 'Send the driver to sign-on or the bay.',
    }
  return null
}

/** P3 and what of P8 is a CHECK. */
function doubtsAbout({ entry, listed, payload }: Found, list: PassList, device: PitDevice): readonly Reason[] {
  const doubts: Reason[] = []
  const age = device.now - Math.max(list.at, device.readBackAt ?? 0)
  if (age > device.listStaleMinutes * 60_000) {
    const minutes = Math.floor(age / 60_000)
    doubts.push({ code: 'list-stale', why: [`List ${list.version} is ${minutes} min old.`], todo: 'Ask on the radio: list, holds?' })
  }
  if (device.clockWentBackwards || age < -CLOCK_TOLERANCE_MS)
    doubts.push({
      code: 'clock',
      why: ['This device’s clock went backwards: the age of its list cannot be told.'],
      todo: 'Set the clock, pull the list, or ask on the radio.',
    })
  const key = payload ? list.keys.find(({ kid }) => kid === payload.kid) : undefined
  if (!listed) {
    const keyWords =
      key && key.state !== 'active' ? ` The device that issued it was ${key.state === 'lost' ? 'reported lost' : 'retired'}.` : ''
    doubts.push({
      code: 'not-on-list',
      why: [`Signature good, but this pass is not on list ${list.version}.${keyWords}`],
      todo: 'Pull the list, or ask the bay by radio.',
    })
  }
  const conditions = listed?.conditions ?? []
  if (conditions.length > 0 || payload?.conditions)
    doubts.push({
      code: 'conditions',
      why: conditions.length > 0 ? conditions.map((words) => `Only with: ${words}`) : ['It runs under conditions: ask the bay which.'],
      todo: 'See that the conditions are kept.',
    })
  if (device.runningGroup !== null && device.runningGroup !== entry.group)
    doubts.push({
      code: 'other-group',
      why: [`Group ${entry.groupName}; another one is running.`],
      todo: 'Ask the driver; send it back if it is not its turn.',
    })
  const barred = peopleAboard(entry).filter(({ may }) => !may)
  if (barred.length > 0)
    doubts.push({
      code: 'some-may-not',
      why: barred.map(({ name, why }) => `${name} may not: ${why}`),
      todo: 'Read the wrist: who is aboard?',
    })
  return doubts
}

function passOfToday(entry: ListedEntry): ListedPass | null {
  return entry.passes.findLast(({ state }) => state === 'live') ?? null
}

function isValidOn({ validFrom, days }: Pick<ListedPass, 'validFrom' | 'days'>, day: string): boolean {
  return validFrom <= day && day < addDays(civilDate(validFrom), days)
}

function daysOf({ validFrom, days }: Pick<ListedPass, 'validFrom' | 'days'>): string {
  return days === 1 ? validFrom : `${validFrom} to ${addDays(civilDate(validFrom), days - 1)}`
}

function blockLines(entry: ListedEntry): readonly string[] {
  return entry.blocks.map(({ words, seeAgain }) => (seeAgain.length > 0 ? `${words}: ${seeAgain.join(', ')} to be seen` : words))
}

/** An entry that reads *held* without a line that says why still says so. */
function bareVerdict(entry: ListedEntry, localBlocks: number): readonly string[] {
  return entry.blocks.length + localBlocks === 0 ? [`The car reads ${entry.verdict}.`] : []
}

function todoForBlocked(entry: ListedEntry): string {
  const onCar = entry.blocks.some(({ stickerRemoved }) => stickerRemoved === false)
  return onCar ? 'Send it to the bay. The sticker is still on: take it off.' : 'Send it to the bay.'
}

function toAnswer(answer: PitAnswer['answer'], reason: Reason, found: Found | null): PitAnswer {
  const { code, why, todo } = reason
  const entry = found?.entry ?? null
  return {
    answer,
    code,
    why,
    todo,
    number: entry?.number ?? null,
    plateTail: entry?.plateTail ?? null,
    plate: entry?.plate ?? null,
    colour: entry?.colour ?? null,
    model: entry?.model ?? null,
    groupName: entry?.groupName ?? null,
    people: entry ? peopleAboard(entry).map(({ name, bandNumber, may, why: because }) => ({ name, bandNumber, may, why: because })) : [],
    passengerSeatUsable: found?.payload?.passengerSeatUsable ?? null,
    entry: entry?.entry ?? null,
    pass: found?.listed?.id ?? (found?.payload ? passId(found.payload) : null),
  }
}
