import { describe, expect, test } from 'vitest'
import { foldEvent } from '@/lib/inspection/fold-event'
import { foldSubject } from '@/lib/inspection/fold-subject'
import { subjectKey } from '@/lib/inspection/subject'
import { FIT, FIT_KEY, CAR_KEY, PERSON, PERSON_KEY, allOk, context, day, finding, hold, pass, presented } from '../support/paddock'
import { fakeId } from '../support/paddock-hash'

/** One car with 60 findings, twelve at each check. */
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

  test('each record is read as often among 40 cars as among 10: no scan goes through the whole event for each of them', () => {
    const readsPerRecord = (cars: number) => {
      const log = Array.from({ length: cars }, (_, index) => aBusyCar(`car ${index} of ${cars}`)).flat()
      let reads = 0
      for (const { record } of log as readonly { readonly record: object }[]) {
        for (const [name, value] of Object.entries(record) as [string, unknown][]) {
          Object.defineProperty(record, name, { enumerable: true, get: () => ((reads += 1), value) })
        }
      }
      expect(foldEvent(log, context()).size).toBe(cars)
      return reads / log.length
    }
    expect(readsPerRecord(40) / readsPerRecord(10)).toBeLessThan(1.1)
  })
})
