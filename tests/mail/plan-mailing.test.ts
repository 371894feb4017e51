import { expect, test } from 'vitest'
import { MAILINGS, type Mailing } from '@/lib/contracts/mail'
import { type MailingFacts, planMailing } from '@/lib/mail/plan-mailing'

const EVENT = { name: 'Ottermere in May', venue: 'Ottermere Ring', firstDay: '2026-05-09', lastDay: '2026-05-10' }
const aDriver = (number: string, name = 'Idris Falkner', to = `${name.toLowerCase().replace(' ', '.')}@marram.example`) => ({
  entry: { id: `entry ${number}`, number, model: 'Oriel GT4' },
  person: { id: name, name },
  to,
})
const aCheck = (number: string, version: number | null, ...weights: ('fail' | 'advisory')[]) => ({
  entry: `entry ${number}`,
  number,
  model: 'Oriel GT4',
  drivers: ['Idris Falkner'],
  version,
  worries: weights.map((weight) => ({ weight, prompt: `tyres, ${weight}`, words: '11 years old, limit 10 years.' })),
})
const facts = (given: Partial<MailingFacts> = {}): MailingFacts => ({
  event: EVENT,
  receivers: [aDriver('7'), aDriver('47', 'Una Marsh')],
  preChecks: [],
  results: [],
  day: '2026-05-02',
  isWritten: () => false,
  ...given,
})
const toWhom = (what: Mailing, given: Partial<MailingFacts> = {}) =>
  planMailing(what, facts(given)).map(({ receiver }) => receiver.entry.number)

test('every driver is invited, and nobody who was', () => {
  expect(toWhom('invitations')).toEqual(['7', '47'])
  expect(toWhom('invitations', { isWritten: (sameAs) => sameAs.includes('entry 47') })).toEqual(['7'])
})

test('a driver whose address was put right is invited anew', () => {
  const first = planMailing('invitations', facts({ receivers: [aDriver('7', 'Idris Falkner', 'wrong@marram.example')] }))[0]?.sameAs
  expect(toWhom('invitations', { receivers: [aDriver('7')], isWritten: (sameAs) => sameAs === first })).toEqual(['7'])
})

test('one who drives two cars is invited to both; one who stands twice on an entry, once', () => {
  expect(toWhom('invitations', { receivers: [aDriver('7'), aDriver('47'), aDriver('47')] })).toEqual(['7', '47'])
})

test('who signed nothing is reminded, once a day', () => {
  const preChecks = [aCheck('7', null), aCheck('47', 1)]
  expect(toWhom('reminders', { preChecks })).toEqual(['7'])
  const today = planMailing('reminders', facts({ preChecks }))[0]?.sameAs
  expect(toWhom('reminders', { preChecks, isWritten: (sameAs) => sameAs === today })).toEqual([])
  expect(toWhom('reminders', { preChecks, day: '2026-05-03', isWritten: (sameAs) => sameAs === today })).toEqual(['7'])
})

test('told is who declared what would not be passed, not who has advisories or signed nothing, and once a declaration', () => {
  const preChecks = [aCheck('7', 2, 'advisory', 'fail'), aCheck('47', 1, 'advisory')]
  expect(toWhom('would-not-be-passed', { preChecks })).toEqual(['7'])
  expect(toWhom('would-not-be-passed', { preChecks: [aCheck('7', null)] })).toEqual([])
  const told = planMailing('would-not-be-passed', facts({ preChecks }))[0]?.sameAs
  expect(toWhom('would-not-be-passed', { preChecks, isWritten: (sameAs) => sameAs === told })).toEqual([])
  expect(toWhom('would-not-be-passed', { preChecks: [aCheck('7', 3, 'fail')], isWritten: (sameAs) => sameAs === told })).toEqual(['7'])
})

test.each([
  ['passed', true],
  ['passed with advisories', true],
  ['not passed', true],
  ['held', true],
  ['in progress', false],
  ['declared only', false],
  ['not presented', false],
  ['withdrawn', false],
] as const)('a car that reads %s has a result to send: %s', (verdict, isSent) => {
  const results = [{ entry: 'entry 7', verdict, open: [] }]
  expect(toWhom('results', { results })).toEqual(isSent ? ['7'] : [])
})

test('a verdict that changed is sent anew', () => {
  const before = planMailing('results', facts({ results: [{ entry: 'entry 7', verdict: 'not passed', open: [] }] }))[0]?.sameAs
  const results = [{ entry: 'entry 7', verdict: 'passed', open: [] }] as const
  expect(toWhom('results', { results, isWritten: (sameAs) => sameAs === before })).toEqual(['7'])
})

test('each mail says which car, when and where, says what to do, and calls nothing safe', () => {
  const given = facts({
    preChecks: [aCheck('7', null), aCheck('47', 1, 'fail', 'advisory')],
    results: [{ entry: 'entry 7', verdict: 'not passed', open: ['Front left: pads 2 mm'] }],
  })
  const link = 'https://bay.marram.example/entry/abc'
  for (const what of MAILINGS) {
    const planned = planMailing(what, given)
    expect(planned.length, what).toBeGreaterThan(0)
    for (const { text: write, receiver, kind } of planned) {
      const { subject, text } = write(link)
      expect(subject).toContain('Ottermere in May')
      expect(subject).toContain(receiver.entry.number)
      expect(text).toContain(`Hello ${receiver.person.name},`)
      expect(text.includes(link)).toBe(kind !== 'result')
      expect(`${subject}${text}`).not.toMatch(/\bsafe|!|undefined|null/)
    }
  }
})

test('what would not be passed is told with its reason, and the scrutineer’s word stands above it', () => {
  const [planned] = planMailing('would-not-be-passed', facts({ preChecks: [aCheck('47', 1, 'fail', 'advisory')] }))
  const { text } = planned?.text('link') ?? { text: '' }
  expect(text).toContain('- tyres, fail: 11 years old, limit 10 years.')
  expect(text).toContain('Sat 9 May 2026 to Sun 10 May 2026')
  expect(text).toContain('The scrutineer decides at the car.')
})
