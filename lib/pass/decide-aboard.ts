import { answer } from './decide-at-pit-exit'
import type { PitAnswer, PitReason } from './pit-answer'
import { nameWithBand } from './pit-people'

/** Who the marshal saw aboard: named people tapped by their id, and how many that are none of them. */
export interface Aboard {
  readonly people: readonly string[]
  readonly unnamed: number
}

/**
 * The answer once the marshal has read the wrists (rule P8). Whoever is aboard and may not go, has no band or is not named makes it HOLD; where all
 * aboard may go, the doubt about the others is settled and nothing else is. A HOLD stays what it is.
 */
export function decideAboard(before: PitAnswer, aboard: Aboard): PitAnswer {
  if (before.answer === 'HOLD') return before
  const holds = holdsAboard(before, aboard)
  if (holds.length > 0) return { ...before, ...answer('HOLD', holds) }
  const left = before.reasons.filter(({ code }) => code !== 'some-may-not')
  return { ...before, ...answer(left.length > 0 ? 'CHECK' : 'PASSED', left) }
}

function holdsAboard(before: PitAnswer, { people, unnamed }: Aboard): readonly PitReason[] {
  const tapped = new Set(people)
  const seated = before.people.filter(({ person }) => tapped.has(person))
  const barred = seated.filter(({ may }) => !may)
  const holds: PitReason[] = []
  // Not "more than none": a count that is no number is not none.
  if (!(unnamed <= 0) || tapped.size > seated.length)
    holds.push({ code: 'unnamed-aboard', why: ['Somebody is aboard who is not named for this car.'], todo: 'Send them to sign-on.' })
  if (barred.length > 0)
    holds.push({
      code: 'aboard-may-not',
      why: barred.map((person) => `${nameWithBand(person)} may not: ${person.why}`),
      todo: 'They get out here, or the car goes back.',
    })
  if (!seated.some(({ drives }) => drives))
    holds.push({ code: 'no-driver-aboard', why: ['None of those tapped is named as a driver of this car.'], todo: 'Tap who is driving.' })
  if (seated.length > 1 && before.passengerSeatUsable !== true)
    holds.push({
      code: 'no-passenger-seat',
      why: ['The pass does not say that the passenger seat may be used.'],
      todo: 'The passenger gets out here, or the car goes back to the bay.',
    })
  return holds
}
