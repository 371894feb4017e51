import { checkReasons } from './check-reasons'
import { findAsked } from './find-asked'
import { holdReasons } from './hold-reasons'
import type { PassList } from './pass-list'
import { passId } from './pass-payload'
import type { PitAnswer, PitReason } from './pit-answer'
import type { PitAsk } from './pit-ask'
import type { PitDevice } from './pit-device'
import type { PitFound } from './pit-found'
import { peopleAboard } from './pit-people'

/** What the marshal does with a car that nothing stops: a signature cannot stop a photocopy, eyes can. */
export const LET_GO = 'Compare number, plate, colour and model; then let it go.'

/**
 * PASSED, HOLD or CHECK, with no network (rules P1 to P8): first whatever says HOLD, however old the list, then whatever says CHECK, and only
 * then PASSED. Total: it answers for any input, and what it cannot make sense of is HOLD.
 */
export function decideAtPitExit(ask: PitAsk, list: PassList | null, device: PitDevice): PitAnswer {
  const found = findAsked(ask, list, device.day)
  if ('code' in found) return { ...answer('HOLD', [found]), ...NOTHING }
  const shown = shownOf(found, device)
  const holds = holdReasons(found, device)
  if (holds.length > 0) return { ...answer('HOLD', holds), ...shown }
  const doubts = checkReasons(found, device)
  return { ...answer(doubts.length > 0 ? 'CHECK' : 'PASSED', doubts), ...shown }
}

type Said = Pick<PitAnswer, 'answer' | 'code' | 'why' | 'todo' | 'reasons'>

/** The answer and its words. Of a HOLD the first thing to do is enough; of a CHECK each doubt wants its own. */
export function answer(says: PitAnswer['answer'], reasons: readonly PitReason[]): Said {
  const todos = [...new Set(reasons.map(({ todo }) => todo))]
  const todo = says === 'CHECK' ? todos.join(' ') : (todos[0] ?? LET_GO)
  return { answer: says, code: reasons[0]?.code ?? 'passed', why: reasons.flatMap(({ why }) => why), todo, reasons }
}

type Shown = Omit<PitAnswer, keyof Said>

/** What an unproven code says of itself is not shown: it would be read as true. */
const NOTHING: Shown = {
  number: null,
  plateTail: null,
  plate: null,
  colour: null,
  model: null,
  groupName: null,
  people: [],
  passengerSeatUsable: null,
  entry: null,
  pass: null,
}

function shownOf({ entry, listed, scanned }: PitFound, device: PitDevice): Shown {
  const { number, plateTail, plate, colour, model, groupName } = entry
  return {
    number,
    plateTail,
    plate,
    colour,
    model,
    groupName,
    people: peopleAboard(entry, device.blocks),
    passengerSeatUsable: scanned?.payload.passengerSeatUsable ?? listed?.passengerSeatUsable ?? null,
    entry: entry.entry,
    pass: listed?.id ?? (scanned ? passId(scanned.payload) : null),
  }
}
