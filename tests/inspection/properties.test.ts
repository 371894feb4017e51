import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { isKnown } from '@/lib/inspection/record'
import type { FoldContext, SubjectState } from '@/lib/inspection/state'
import { asText, CAR_KEY, SUNDAY, context, finding, hold } from '../support/paddock'
import { randomFrom } from '../support/every-order'
import { honestLog, PRESENTS_AGAIN, type Deed } from '../support/paddock-day'

const deed: fc.Arbitrary<Deed> = fc.record({
  what: fc.nat(23),
  where: fc.nat(59),
  who: fc.nat(2),
  hasPulled: fc.boolean(),
  fate: fc.nat(99),
})
const deeds = fc.array(deed, { minLength: 5, maxLength: 40 })
const honest = deeds.map(honestLog)

/** The same records with `basis` and `answers` drawn anew from whatever came before: devices that are broken or lie. */
const wild = fc.tuple(honest, fc.nat()).map(([log, seed]) => {
  const next = randomFrom(seed)
  return log.map((entry, index): LogEntry => {
    const some = (share: number) =>
      log
        .slice(0, index)
        .filter(() => next() < share)
        .map(({ hash }) => hash)
    return next() < 0.5 ? entry : ({ ...entry, record: { ...entry.record, basis: some(0.3), answers: some(0.6) } } as LogEntry)
  })
})
const any = fc.oneof(honest, wild)

function fold(log: readonly LogEntry[], told: FoldContext = context()): SubjectState {
  return foldSubject(log, CAR_KEY, told)
}

function dead(state: SubjectState): readonly string[] {
  return state.passes.filter((pass) => pass.state === 'dead').map(({ hash }) => hash)
}

function isPassing({ verdict }: SubjectState): boolean {
  return verdict === 'passed' || verdict === 'passed with advisories'
}

const settings = { numRuns: 200 } as const
/** Generous: on a busy machine these take several seconds. */
const patient = { timeout: 60_000 } as const

describe('whatever the log', patient, () => {
  test('any order, and any record twice, gives the same state', () => {
    const shuffled = any.chain((log) =>
      fc.tuple(fc.constant(log), fc.shuffledSubarray([...log, ...log.slice(0, 3)], { minLength: log.length + Math.min(3, log.length) })),
    )
    fc.assert(
      fc.property(shuffled, ([log, other]) => {
        expect(asText(fold(other))).toBe(asText(fold(log)))
      }),
      settings,
    )
  })

  test('[F7] a dead pass stays dead as records come, and on the next day', () => {
    fc.assert(
      fc.property(any, (log) => {
        let before: readonly string[] = []
        for (let length = 1; length <= log.length; length += 1) {
          const now = dead(fold(log.slice(0, length)))
          expect(now).toEqual(expect.arrayContaining([...before]))
          before = now
        }
        expect(dead(fold(log, context({ day: SUNDAY })))).toEqual(expect.arrayContaining([...before]))
      }),
      { numRuns: 150 },
    )
  })

  test('[F7] a fail or hold that comes later leaves no pass alive', () => {
    fc.assert(
      fc.property(any, fc.boolean(), (log, isFail) => {
        const stop = isFail ? finding('seat.mounts', 'fail') : hold({ stations: ['seat'] })
        expect(fold([...log, stop]).passes.filter((pass) => pass.state === 'live')).toEqual([])
      }),
      settings,
    )
  })

  test('[F7] no pass lives beside a fail that stands, or beside a block that it does not answer', () => {
    fc.assert(
      fc.property(any, (log) => {
        const state = fold(log)
        for (const pass of state.passes.filter((one) => one.state === 'live')) {
          expect(state.fails).toEqual([])
          expect(state.blocks.map(({ hash }) => hash).filter((hash) => !pass.record.answers.includes(hash))).toEqual([])
        }
      }),
      settings,
    )
  })

  test('[F4] where a fail was recorded and none stands, somebody who may end it has named it', () => {
    fc.assert(
      fc.property(any, (log) => {
        const state = fold(log)
        for (const { hash, record, disposition } of log) {
          if (!isKnown(record) || record.kind !== 'finding' || record.outcome !== 'fail') continue
          if (disposition.state === 'quarantined' && disposition.code === 'unknown-enrolment') continue
          if (state.checks.get(record.check)?.standing === 'fail') continue
          const enders = log.filter(({ record: other }) => mayEnd(other, record))
          expect(enders.filter(({ record: other }) => isKnown(other) && other.basis.includes(hash))).not.toEqual([])
        }
      }),
      settings,
    )
  })
})

describe('with honest devices', patient, () => {
  test('[T1] taking a record’s permission away never makes a stopped car pass', () => {
    fc.assert(
      fc.property(deeds, (drawn) => {
        // One `presented` only: what it asks for goes with it, and limits set back make an older look count again (decision 18).
        const log = honestLog(drawn.filter(({ what }) => what !== PRESENTS_AGAIN))
        const wasPassing = isPassing(fold(log))
        for (const [index, entry] of log.entries()) {
          if (entry.disposition.state === 'quarantined') continue
          const distrusted: LogEntry = { ...entry, disposition: { state: 'quarantined', code: 'wrong-role' } }
          if (isPassing(fold(log.with(index, distrusted)))) expect([wasPassing, entry.record.kind]).toEqual([true, entry.record.kind])
        }
      }),
      { numRuns: 150 },
    )
  })

  test('the days drawn here are worth looking at: some pass, some are held, some fail, and passes live and die', () => {
    const seen = new Set<string>()
    for (const log of fc.sample(honest, { numRuns: 400, seed: 7 })) {
      const state = fold(log)
      seen.add(state.verdict)
      for (const pass of state.passes) seen.add(pass.state).add(pass.killedBy[0]?.reason ?? 'not killed')
    }
    for (const one of ['passed', 'passed with advisories', 'held', 'not passed', 'in progress', 'withdrawn', 'live', 'dead', 'quarantined'])
      expect(seen).toContain(one)
    for (const why of [
      'fail-not-answered',
      'hold-not-answered',
      'recall-not-answered',
      'repair-not-answered',
      'pins-changed',
      'entry-changed',
      'withdrawn',
    ])
      expect(seen).toContain(why)
  })
})

/** Who may end a fail, said a second time and without the product's help: a look, its own maker, or the chief. */
function mayEnd(other: LogEntry['record'], fail: { readonly check: string; readonly actor: string }): boolean {
  if (!isKnown(other) || !('check' in other) || other.check !== fail.check) return false
  if (other.kind === 'ruling' || other.kind === 'dispensation') return true
  if (other.outcome === 'unseen') return other.actor === fail.actor
  return other.outcome !== 'could-not-see' && other.carriedFrom === undefined
}
