import { answersFor, basisFor, basisForUndo, passAnswers, passBasis, presentedBasis, returnedBasis } from '@/lib/inspection/compose'
import { wetOffBasis } from '@/lib/inspection/compose-day'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry, QuarantineCode } from '@/lib/inspection/log-entry'
import type { SubjectState } from '@/lib/inspection/state'
import {
  CAR_KEY,
  CREW,
  GROUP_A,
  SATURDAY,
  adopted,
  comment,
  context,
  day,
  dispensation,
  entryChanged,
  finding,
  hold,
  lifted,
  pass,
  presented,
  recall,
  ruling,
  unknownKind,
  voided,
} from './paddock'
import { PADDOCK_LIMITS, TIGHTER_LIMITS, paddockCheck } from './paddock-book'

/** One thing done at the car: numbers picked at random say what, where, by whom, and whether that device had pulled before. */
export interface Deed {
  readonly what: number
  readonly where: number
  readonly who: number
  readonly hasPulled: boolean
  /** The server's answer: mostly accepted. */
  readonly fate: number
}

const CHECKS = [
  'brakes.pads',
  'wheels.tread',
  'wheels.nuts.front',
  'wheels.nuts.rear',
  'seat.mounts',
  'body.mirror',
  'body.undertray',
] as const
/** The deed that pins limits, facts and depth anew. */
export const PRESENTS_AGAIN = 17

const PEOPLE = [CREW.asha, CREW.ben, CREW.chief] as const
const CODES: readonly QuarantineCode[] = ['wrong-role', 'device-lost', 'shown-differs', 'unknown-enrolment']

/**
 * The log of a day as three honest devices make it: each composes with what the product gives it, from the server's log as it last pulled it
 * and its own records. In the order the server numbered them, which is an order in which nothing names what is not yet there.
 */
export function honestLog(deeds: readonly Deed[]): readonly LogEntry[] {
  const log: LogEntry[] = [presented(), ...CHECKS.map((check) => finding(check, 'ok'))]
  const pulled = PEOPLE.map(() => log.length)
  for (const deed of deeds) {
    const who = deed.who % PEOPLE.length
    if (deed.hasPulled) pulled[who] = log.length
    const actor = PEOPLE[who] as string
    const known = log.filter((entry, index) => index < (pulled[who] ?? 0) || entry.record.actor === actor)
    const made = record(deed, actor, known, foldSubject(known, CAR_KEY, context()))
    if (made) log.push(made)
  }
  return log
}

function record(deed: Deed, actor: string, known: readonly LogEntry[], state: SubjectState): LogEntry | null {
  const check = CHECKS[deed.where % CHECKS.length] as string
  const code = deed.fate < 85 ? undefined : CODES[deed.fate % CODES.length]
  const said = { actor, ...(code ? { quarantined: code } : {}) }
  const line = { ...said, basis: basisFor(state, check), answers: answersFor(state, check) }
  // Limits are tightened and stay so: set back, an older look would count again, and more so without the newer one.
  const isTightened = state.presentedHeads.some((head) => head.record.limits === TIGHTER_LIMITS)
  const paramsHash =
    check === 'wheels.tread' ? { paramsHash: paddockCheck(check, isTightened ? TIGHTER_LIMITS : PADDOCK_LIMITS).paramsHash } : {}
  const pick = <T>(list: readonly T[]): T | undefined => list[deed.where % Math.max(list.length, 1)]
  switch (deed.what % 24) {
    case 0:
    case 1:
    case 2:
    case 3:
    case 4:
    case 5:
      return finding(check, 'ok', { ...line, ...paramsHash })
    case 6:
      return finding(check, 'advisory', { ...line, ...paramsHash })
    case 7:
    case 8:
      return finding(check, 'fail', line)
    case 9:
      return finding(check, 'could-not-see', line)
    case 10:
      return finding(check, 'ok', { ...line, ...paramsHash, found: { outcome: 'fail', reason: 'loose' } })
    case 11: {
      const basis = basisForUndo(state, check, actor)
      return basis.length === 0 ? null : finding(check, 'unseen', { ...said, basis })
    }
    case 12:
      return hold({ ...said, stations: deed.where % 5 === 0 ? [] : [check.split('.')[0] as string] })
    case 13:
      return lifted(
        state.blocks.slice(0, 1).map(({ hash }) => hash),
        said,
      )
    case 14:
      return recall(deed.where % 2 === 0 ? { when: 'wet' } : { when: 'session-over', group: GROUP_A, session: 1 }, {
        ...said,
        checks: [check],
      })
    case 15:
      return day(deed.where % 2 === 0 ? { what: 'wet', on: true } : { what: 'session-over', group: GROUP_A, session: 1 }, said)
    case 16:
      return day({ what: 'wet', on: false }, { ...said, basis: wetOffBasis(known) })
    case PRESENTS_AGAIN: {
      const facts = { cage: false, slicks: deed.where % 2 === 0 }
      const limits = isTightened || deed.where % 3 === 0 ? { limits: TIGHTER_LIMITS } : {}
      return presented({ ...said, basis: presentedBasis(state), facts, ...limits, depth: deed.where % 4 === 0 ? 'full' : 'look-over' })
    }
    case 18:
    case 19:
      return pass({ ...said, answers: passAnswers(state), basis: deed.where % 2 === 0 ? passBasis(state) : [] })
    case 20: {
      const isFailed = state.checks.get(check)?.standing === 'fail'
      return isFailed ? dispensation(check, deed.where % 2 === 0 ? SATURDAY : null, { ...said, basis: line.basis }) : null
    }
    case 21:
      return ruling(check, deed.where % 2 === 0 ? 'ok' : 'advisory', line)
    case 22: {
      const target = pick(known.filter(({ disposition }) => disposition.state === 'quarantined'))
      return target ? adopted(target, { ...said, subject: target.record.subject }) : comment(said)
    }
    default:
      return rarely(deed, said, state, pick(known))
  }
}

function rarely(deed: Deed, said: { readonly actor: string }, state: SubjectState, any: LogEntry | undefined): LogEntry | null {
  switch (deed.where % 6) {
    case 0:
      return entryChanged({ what: 'withdrawn' }, said)
    case 1:
      return entryChanged({ what: 'returned' }, { ...said, basis: returnedBasis(state) })
    case 2:
      return entryChanged({ what: 'plate', plateTail: 'XYZ' }, said)
    case 3:
      return unknownKind('stops', said)
    case 4:
      return state.passes[0] ? voided(state.passes[0].hash, said) : null
    default:
      return any ? finding('seat.mounts', 'ok', { ...said, basis: [any], carriedFrom: 'c'.repeat(64) }) : null
  }
}
