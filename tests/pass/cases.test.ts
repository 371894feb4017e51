import { describe, expect, test } from 'vitest'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { ListedBlock } from '@/lib/pass/pass-list'
import { CAR, FIT, GROUP_A, PERSON, allOk, day, finding, hold, presented, recall } from '../support/paddock'
import { CO_DRIVER, foldedList, signedBand, signedPass } from './a-folded-list'
import { aDevice, aList, anEntry, aPass, aPerson, aToken, BEN, MINUTE, NOW, scan } from './a-pit-exit'

const held: ListedBlock = { kind: 'hold', words: 'Light contact', seeAgain: ['Brakes'], at: NOW - 5 * MINUTE, stickerRemoved: true }
const device = aDevice({ timeZone: 'UTC' })

describe('[case 1] a pass that was issued, and a fail the tablet that issued it had not heard of', () => {
  test('is HOLD once the list has the fail', async () => {
    const fail: ListedBlock = { kind: 'fail', words: 'brakes: pad worn', seeAgain: [], at: NOW, stickerRemoved: null }
    const entry = anEntry({ verdict: 'not passed', blocks: [fail], passes: [aPass({ state: 'dead', why: 'something failed' })] })
    expect(await scan(aToken(), aList([entry]))).toMatchObject({ answer: 'HOLD', code: 'dead-pass' })
  })

  test('is HOLD too where the fail came and the pass has not', async () => {
    expect(await scan(aToken(), aList([anEntry({ verdict: 'not passed', passes: [] })]))).toMatchObject({ answer: 'HOLD', code: 'blocked' })
  })
})

test('[case 21] a recall after session 1, session 1 over and the car not shown, is HOLD', async () => {
  const due: ListedBlock = { kind: 'recall', words: 'recall due', seeAgain: ['Brakes'], at: null, stickerRemoved: null }
  const entry = anEntry({ verdict: 'held', blocks: [due], passes: [aPass({ state: 'dead', why: 'a recall fell due' })] })
  const answer = await scan(aToken(), aList([entry]))
  expect(answer).toMatchObject({ answer: 'HOLD' })
  expect(answer.why).toContain('recall due; Brakes to be seen')
})

test('[case 21] a device that knows session 1 to be over does not wait for the list to say so', async () => {
  const blocks = [{ about: { entry: 'entry-5' }, words: 'recall due', at: null }]
  expect(await scan(aToken(), aList(), aDevice({ blocks }))).toMatchObject({ answer: 'HOLD', code: 'blocked', why: ['recall due'] })
})

test('[case 22] a pass killed, everything seen again, a new pass: the old one HOLD, the new one PASSED', async () => {
  const list = aList([anEntry({ passes: [aPass({ state: 'dead', why: 'held since' }), aPass({}, { counter: 2 })] })])
  expect(await scan(aToken(), list)).toMatchObject({
    answer: 'HOLD',
    code: 'dead-pass',
    todo: 'Scan its newer sticker; take this one off.',
  })
  expect(await scan(aToken({ counter: 2 }), list)).toMatchObject({ answer: 'PASSED' })
})

test('[case 23] a helmet that failed after the band: alone that driver is HOLD, beside a co-driver CHECK with names', async () => {
  const ana = aPerson({ band: 'dead', why: 'band is dead: helmet: label cut' })
  expect(await scan(aToken(), aList([anEntry({ people: [ana] })]))).toMatchObject({ answer: 'HOLD', code: 'nobody-may-drive' })
  const both = await scan(aToken(), aList([anEntry({ people: [ana, BEN] })]))
  expect(both).toMatchObject({ answer: 'CHECK', code: 'some-may-not' })
  expect(both.why).toEqual(['May go: Ben Oduya (band 113)', 'Ana Brand (band 112) may not: band is dead: helmet: label cut'])
})

test('[case 24] a fit that failed bars that driver from that car and from no other', async () => {
  const ana = aPerson({ fit: 'failed', why: 'does not fit this car' })
  const spare = anEntry({
    entry: 'entry-6',
    code: 6,
    number: '48',
    passes: [aPass({}, { counter: 2, entry: 6, number: '48' })],
    people: [aPerson()],
  })
  const list = aList([anEntry({ people: [ana, BEN] }), spare])
  expect(await scan(aToken(), list)).toMatchObject({ answer: 'CHECK', people: [{ may: false, bandNumber: '112' }, { may: true }] })
  expect(await scan(aToken({ counter: 2, entry: 6, number: '48' }), list)).toMatchObject({ answer: 'PASSED' })
})

describe('[case 30] a held car and a stale list are HOLD, never CHECK', () => {
  test.each([
    ['its pass on the list', [aPass()]],
    ['its pass not on the list', []],
    ['its pass dead', [aPass({ state: 'dead', why: 'held since' })]],
  ])('%s', async (_, passes) => {
    for (const minutes of [31, 600, 10_000]) {
      const list = aList([anEntry({ verdict: 'held', blocks: [held], passes })], { at: NOW - minutes * MINUTE })
      expect(await scan(aToken(), list)).toMatchObject({ answer: 'HOLD' })
      expect(await scan(aToken(), list, aDevice({ clockWentBackwards: true, runningGroup: 'group-b' }))).toMatchObject({ answer: 'HOLD' })
    }
  })
})

/** What a driver needs to go: presented, label seen, banded. */
function banded(who: { readonly person: string }, number: string): readonly LogEntry[] {
  const seated = presented({ subject: who })
  return [seated, finding('helmet.label', 'ok', { subject: who }), signedBand(number, { subject: who, answers: [seated] })]
}

/** What both drivers need to sit in this car. */
function fitted(): readonly LogEntry[] {
  return [FIT, { fit: CAR.car, person: CO_DRIVER.person }].flatMap((subject) => [
    presented({ subject }),
    finding('reach.headroom', 'ok', { subject }),
  ])
}

describe('from the records to the answer', () => {
  const shown = presented()
  const issued = signedPass({ answers: [shown] })
  const ready = [shown, ...allOk(), issued, ...banded(PERSON, '112'), ...banded(CO_DRIVER, '113'), ...fitted()]

  test('[P4] a car walked and passed, two drivers banded, is PASSED', async () => {
    expect(await scan(aToken(), foldedList(ready), device)).toMatchObject({
      answer: 'PASSED',
      people: [
        { name: 'Ana Brand', bandNumber: '112', may: true },
        { name: 'Ben Oduya', bandNumber: '113', may: true },
      ],
    })
  })

  test('[P6] once the list has a record that kills the pass, it is never PASSED again, whatever is seen afterwards', async () => {
    const stop = hold({ stations: ['brakes'] })
    const again = allOk({ answers: [stop] })
    for (const since of [[stop], [stop, ...again]]) {
      const answer = await scan(aToken(), foldedList([...ready, ...since]), device)
      expect(answer).toMatchObject({ answer: 'HOLD', code: 'dead-pass' })
      expect(answer.why[0]).toBe('This pass is dead: held since.')
    }
    const fresh = signedPass({ answers: [shown, stop], basis: [issued] }, { counter: 2 })
    const list = foldedList([...ready, stop, ...again, fresh])
    expect(await scan(aToken(), list, device)).toMatchObject({ answer: 'HOLD' })
    expect(await scan(aToken({ counter: 2 }), list, device)).toMatchObject({ answer: 'PASSED' })
  })

  test('[P4] a hold is said in the checklist’s words, with the stations to be seen', async () => {
    const list = foldedList([...ready, hold({ reason: 'contact', stations: ['body', 'brakes'], at: Date.parse('2026-05-09T09:31:00Z') })])
    expect((await scan(aToken(), list, device)).why).toContain('light contact, 09:31; Body, Brakes to be seen')
  })

  test('[P4] a hold that names nothing is said to be the chief’s to lift', async () => {
    const list = foldedList([...ready, hold({ at: Date.parse('2026-05-09T09:31:00Z') })])
    expect((await scan(aToken(), list, device)).why).toContain('light contact, 09:31; only the chief lifts it')
  })

  test('[P4] what could not be seen since kills no pass, and holds the car', async () => {
    const ok = finding('brakes.pads', 'ok')
    const records = [...ready.filter(({ record }) => !('check' in record && record.check === 'brakes.pads')), ok]
    expect(await scan(aToken(), foldedList(records), device)).toMatchObject({ answer: 'PASSED' })
    const list = foldedList([...records, finding('brakes.pads', 'could-not-see', { basis: [ok] })])
    expect(await scan(aToken(), list, device)).toMatchObject({ answer: 'HOLD', code: 'verdict' })
  })

  test('[case 21] a recall due from the record that session 1 is over is HOLD', async () => {
    const later = recall({ when: 'session-over', group: GROUP_A, session: 1 }, { stations: ['brakes'] })
    expect(await scan(aToken(), foldedList([...ready, later]), device)).toMatchObject({ answer: 'PASSED' })
    const over = day({ what: 'session-over', group: GROUP_A, session: 1 })
    expect(await scan(aToken(), foldedList([...ready, later, over]), device)).toMatchObject({ answer: 'HOLD', code: 'dead-pass' })
  })

  test('[case 23] a helmet that fails afterwards is CHECK with names; the car’s pass lives', async () => {
    const list = foldedList([...ready, finding('helmet.label', 'fail', { subject: PERSON, reason: 'other' })])
    expect(list.entries[0]?.passes[0]?.state).toBe('live')
    const answer = await scan(aToken(), list, device)
    expect(answer).toMatchObject({ answer: 'CHECK', code: 'some-may-not' })
    expect(answer.why[1]).toBe('Ana Brand (band 112) may not: band is dead: helmet.label: anything else')
    const alone = foldedList([...ready, finding('helmet.label', 'fail', { subject: PERSON })], {
      car: { people: [{ ...PERSON, role: 'driver' }] },
    })
    expect(await scan(aToken(), alone, device)).toMatchObject({ answer: 'HOLD', code: 'nobody-may-drive' })
  })

  test('[case 24] a fit that fails bars that driver; pass and bands live', async () => {
    const list = foldedList([...ready, finding('reach.headroom', 'fail', { subject: FIT })])
    expect(list.entries[0]?.people).toMatchObject([
      { band: 'live', fit: 'failed' },
      { band: 'live', fit: 'passed' },
    ])
    expect(list.entries[0]?.passes[0]?.state).toBe('live')
    const answer = await scan(aToken(), list, device)
    expect(answer).toMatchObject({ answer: 'CHECK', people: [{ may: false, why: 'does not fit this car' }, { may: true }] })
  })
})
