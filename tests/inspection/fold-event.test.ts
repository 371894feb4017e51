import { describe, expect, test } from 'vitest'
import { foldEvent } from '@/lib/inspection/fold-event'
import { foldSubject } from '@/lib/inspection/fold-subject'
import { subjectKey } from '@/lib/inspection/subject'
import { FIT, FIT_KEY, CAR_KEY, PERSON, PERSON_KEY, allOk, context, day, finding, hold, pass, presented } from '../support/paddock'
import { fakeId } from '../support/paddock-hash'

/** One car with 60 findings: a look at every check, and eleven more times at each. */
function aBusyCar(words: string) {
  const subject = { car: fakeId(words) }
  const shown = presented({ subject })
  const stop = hold({ subject, stations: ['brakes'] })
  const rounds = Array.from({ length: 12 }, () => allOk({ subject, answers: [stop] }))
  return [shown, stop, ...rounds.flat(), pass({ subject, answers: [shown, stop] })]
}

describe('foldEvent', () => {
  test('each subject gets what foldSubject gives it', () => {
    const log = [
      presented(),
      ...allOk(),
      presented({ subject: PERSON }),
      finding('helmet.label', 'ok', { subject: PERSON }),
      presented({ subject: FIT }),
    ]
    const told = context()
    const states = foldEvent([...log, day({ what: 'wet', on: true })], told)

    expect([...states.keys()]).toEqual([CAR_KEY, FIT_KEY, PERSON_KEY])
    for (const [key, state] of states) expect(state).toEqual(foldSubject([...log, day({ what: 'wet', on: true })], key, told))
  })

  test('[F6] a declared car without a record is in the result as declared only', () => {
    const key = subjectKey({ car: fakeId('declared') })
    expect(foldEvent([], context({ declared: new Set([key]) })).get(key)?.verdict).toBe('declared only')
  })

  test('the work grows with the number of entries and not with its square: 300 entries of 60 findings', () => {
    const cars = Array.from({ length: 300 }, (_, index) => aBusyCar(`car ${index}`))
    const few = cars.slice(0, 75).flat()
    const all = cars.flat()
    foldEvent(few, context())
    const took = (entries: typeof all) => {
      const runs = [0, 1, 2].map(() => {
        const from = performance.now()
        expect(foldEvent(entries, context()).size).toBeGreaterThan(0)
        return performance.now() - from
      })
      return Math.min(...runs)
    }
    const [small, large] = [took(few), took(all)]
    expect(large).toBeLessThan(Math.max(small * 8, 150))
  })
})
