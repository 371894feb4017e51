import { addDays, parseCivilDate } from '@/lib/rules/civil-date'
import { dateInWords } from '@/lib/rules/date-in-words'
import { foldToBase40 } from './base40'
import { sameNumber } from './look-up'
import { hasPassed, isBlocked, isValidOn, livePasses } from './may-run'
import { CHIEF_ONLY, type ListedBlock, type ListedEntry, type ListedPass } from './pass-list'
import type { PitReason } from './pit-answer'
import type { PitDevice } from './pit-device'
import type { PitFound } from './pit-found'
import { nameWithBand, peopleAboard } from './pit-people'
import { showTail } from './plate-tail'
import { venueTime } from './venue-time'

const TO_BAY = 'Send the car to the bay.'

/** All that says HOLD of a car that was found, most important first; none of it asks how old the list is (rules P2, P4, P6, P8). */
export function holdReasons(found: PitFound, device: PitDevice): readonly PitReason[] {
  return [...ofPass(found, device), ...ofNumber(found), ...ofCar(found, device), ...ofPeople(found, device)]
}

function ofPass({ entry, listed, scanned }: PitFound, { day }: PitDevice): readonly PitReason[] {
  const pass = scanned?.payload ?? listed
  const reasons: PitReason[] = []
  if (pass && !isValidOn(pass, day))
    reasons.push({ code: 'wrong-day', why: [`This pass is for ${daysOf(pass)}; today is ${dayWords(day)}.`], todo: TO_BAY })
  switch (listed?.state) {
    case undefined:
      if (scanned?.payload.printedAhead) reasons.push(NOT_ALIVE)
      break
    case 'live':
      break
    case 'dead':
      reasons.push({
        code: 'dead-pass',
        why: [`This pass is dead${listed?.why ? `: ${listed.why}` : ''}.`],
        todo: todoForDead(entry, listed, day),
      })
      break
    case 'printed-ahead':
      reasons.push(NOT_ALIVE)
      break
    default:
      reasons.push({ code: 'quarantined-pass', why: ['It was issued without the right to issue; it counts for nothing.'], todo: TO_BAY })
  }
  return reasons
}

const NOT_ALIVE: PitReason = { code: 'not-alive', why: ['Printed ahead, and the car has not been passed since.'], todo: TO_BAY }

function todoForDead(entry: ListedEntry, dead: ListedPass | null, day: string): string {
  const newer = livePasses(entry, day).some((pass) => pass !== dead)
  return newer && !isBlocked(entry) ? 'Scan its newer sticker; take this one off.' : 'Send the car to the bay; take this sticker off.'
}

function ofNumber({ entry, scanned }: PitFound): readonly PitReason[] {
  if (scanned === null) return []
  const { number, plateTail } = scanned.payload
  if (number === foldToBase40(entry.number) && plateTail === foldToBase40(entry.plateTail)) return []
  const says = `The sticker says ${number} ${showTail(plateTail)}, the list ${entry.number} ${showTail(entry.plateTail)}.`
  return [{ code: 'number-differs', why: [says], todo: TO_BAY }]
}

function ofCar({ entry, listed, scanned, list }: PitFound, device: PitDevice): readonly PitReason[] {
  const local = device.blocks.filter(
    ({ about }) => ('entry' in about && about.entry === entry.entry) || ('number' in about && sameNumber(about.number, entry.number)),
  )
  if (isBlocked(entry) || local.length > 0) {
    const lines = [
      ...local.map(({ words, at }) => `${words}${since(at, device.timeZone)}`),
      ...entry.blocks.flatMap((block) => [blockLine(block, device.timeZone), ...(block.warning === undefined ? [] : [block.warning])]),
    ]
    const why = lines.length > 0 ? lines : [`The car reads ${entry.verdict}.`]
    return [{ code: 'blocked', why, todo: todoForBlocked(entry) }]
  }
  if (!listed && !scanned)
    return [{ code: 'no-live-pass', why: [`No pass on list ${list.version}; the car reads ${entry.verdict}.`], todo: TO_BAY }]
  // Before its pass is on the list the verdict there may be older than the pass; that is a doubt, not a block.
  if (listed && !hasPassed(entry)) return [{ code: 'verdict', why: [`The car reads ${entry.verdict}.`], todo: TO_BAY }]
  return []
}

function ofPeople({ entry }: PitFound, { blocks }: PitDevice): readonly PitReason[] {
  const people = peopleAboard(entry, blocks)
  if (people.some(({ drives, may }) => drives && may)) return []
  if (!people.some(({ drives }) => drives))
    return [{ code: 'nobody-named', why: ['No driver is named for this car.'], todo: 'Send the driver to sign-on.' }]
  const why = people.filter(({ drives }) => drives).map((person) => `${nameWithBand(person)} may not drive: ${person.why}`)
  return [{ code: 'nobody-may-drive', why, todo: 'Send the driver to sign-on.' }]
}

/** `Fluid dropped, 09:31; Engine bay, Tyres to be seen`. */
function blockLine({ words, at, seeAgain }: ListedBlock, timeZone: string): string {
  const again = seeAgain.includes(CHIEF_ONLY) ? `; ${CHIEF_ONLY}` : seeAgain.length > 0 ? `; ${seeAgain.join(', ')} to be seen` : ''
  return `${words}${since(at, timeZone)}${again}`
}

function since(at: number | null, timeZone: string): string {
  const time = at === null ? '' : venueTime(at, timeZone)
  return time === '' ? '' : `, ${time}`
}

function todoForBlocked(entry: ListedEntry): string {
  const isStickerOn = entry.blocks.some(({ stickerRemoved }) => stickerRemoved === false)
  return isStickerOn ? 'Send the car to the bay. Its sticker was left on: take it off.' : TO_BAY
}

function daysOf({ validFrom, days }: Pick<ListedPass, 'validFrom' | 'days'>): string {
  const first = parseCivilDate(validFrom)
  if (first === null) return 'a day that is none'
  return days === 1 ? dateInWords(first) : `${dateInWords(first)} to ${dateInWords(addDays(first, days - 1))}`
}

function dayWords(day: string): string {
  const date = parseCivilDate(day)
  return date === null ? 'not known here' : dateInWords(date)
}
