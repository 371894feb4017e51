import { describe, expect, test } from 'vitest'
import type { ExistingEntry } from '@/lib/entries/plan-import'
import { csvText } from '@/lib/platform/csv-text'
import { aLine, aList, fixture, GROUPS, HEAD, planned } from '../support/a-list'

const second = (said: Parameters<typeof aLine>[0] = {}) =>
  aLine({ number: '8', firstName: 'Bo', surname: 'Lind', email: 'bo@example.org', plate: 'BB22 BBB', ...said })
const open = (plan: ReturnType<typeof planned>) => plan.questions.filter(({ answer }) => answer === null).map(({ id }) => id)
const cars = (plan: ReturnType<typeof planned>) =>
  plan.plan.add.map(
    ({ number, plate, people }) =>
      `${number} ${plate}: ${people.map(({ name, role }) => `${name}${role === 'driver' ? '' : ` (${role})`}`).join(' + ')}`,
  )

describe('what stands twice is asked', () => {
  const samePlate = aList(aLine(), second({ plate: 'GF90VGN', note: 'sharing with car above' }))
  const sameNumber = aList(aLine(), second({ number: '7' }))

  test.each([
    ['a plate, open: nothing is guessed from its note', samePlate, {}, ['row:3'], ['7 GF90 VGN: Ada Norcott']],
    ['a plate: one car, two drivers', samePlate, { 'row:3': 'shared' }, [], ['7 GF90 VGN: Ada Norcott + Bo Lind']],
    ['a plate: two cars under a trade plate', samePlate, { 'row:3': 'two-cars' }, [], ['7 GF90 VGN: Ada Norcott', '8 GF90VGN: Bo Lind']],
    ['a plate: one row too many', samePlate, { 'row:3': 'leave-out' }, [], ['7 GF90 VGN: Ada Norcott']],
    ['a number, open', sameNumber, {}, ['row:3'], ['7 GF90 VGN: Ada Norcott']],
    ['a number: one car, two drivers', sameNumber, { 'row:3': 'shared' }, [], ['7 GF90 VGN: Ada Norcott + Bo Lind']],
    ['a number: two cars', sameNumber, { 'row:3': 'two-cars=8' }, [], ['7 GF90 VGN: Ada Norcott', '8 BB22 BBB: Bo Lind']],
    ['a number: two cars, but no other number said', sameNumber, { 'row:3': 'two-cars' }, ['row:3'], ['7 GF90 VGN: Ada Norcott']],
    ['a number: two cars, but that number is taken', sameNumber, { 'row:3': 'two-cars=7' }, ['row:3'], ['7 GF90 VGN: Ada Norcott']],
    ['an answer that is not offered', samePlate, { 'row:3': 'whatever' }, ['row:3'], ['7 GF90 VGN: Ada Norcott']],
  ])('%s', (_, bytes, answers, stillOpen, then) => {
    const plan = planned(bytes, { answers: answers })
    expect(open(plan)).toEqual(stillOpen)
    expect(cars(plan)).toEqual(then)
  })

  test('a row that says the same in every cell is asked about as one too many', () => {
    const plan = planned(aList(aLine(), aLine()))
    expect(plan.questions).toMatchObject([{ id: 'row:3', likely: 'leave-out', answer: null }])
  })

  test('each answer says in words what it does', () => {
    const { questions } = planned(samePlate, { answers: { 'row:3': 'shared' } })
    expect(questions[0]?.does).toBe('Bo Lind drives entry 7 too (GF90 VGN, Tessier Petite, as row 2 says).')
  })
})

describe('who is one person', () => {
  test.each([
    ['same name and e-mail', {}, 1, []],
    ['same name and mobile, no e-mail', { email: '', mobile: '+44 7700 900001' }, 1, []],
    ['same name and mobile, another e-mail', { email: 'a.norcott@example.org', mobile: '+44 7700 900001' }, 2, ['person:3:ada norcott']],
    ['same e-mail, another name', { firstName: 'Olof', mobile: '' }, 2, ['person:3:olof norcott']],
    ['same name only', { email: 'other@example.org', mobile: '+44 7700 900002' }, 2, []],
    ['nothing the same', { firstName: 'Bo', email: 'bo@example.org', mobile: '' }, 2, []],
  ])('%s', (_, said, people, asked) => {
    const plan = planned(aList(aLine({ mobile: '+447700900001' }), aLine({ number: '8', plate: 'BB22', mobile: '+447700900001', ...said })))
    expect(plan.people.all).toHaveLength(people)
    expect(open(plan)).toEqual(asked)
  })

  test('answered as one they need one band; a namesake with another address is said', () => {
    const bytes = aList(aLine(), aLine({ number: '8', plate: 'BB22', firstName: 'Adda' }))
    expect(planned(bytes, { answers: { 'person:3:adda norcott': 'one' } }).people.all).toHaveLength(1)
    const namesake = planned(aList(aLine(), aLine({ number: '8', plate: 'BB22', email: 'x@example.org' })))
    expect(namesake.remarks).toMatchObject([{ row: 3, words: expect.stringContaining('taken as two people') as string }])
  })
})

describe('run groups', () => {
  test.each([
    ['another writing', 'novice ', [], null],
    ['a beginning', 'INTER', ['group:inter'], 'is:Intermediate'],
    ['a beginning with a full stop', 'adv.', ['group:adv.'], 'is:Advanced'],
    ['another word', 'Beginners', ['group:beginners'], null],
  ])('%s: %o', (_, group, asked, likely) => {
    const plan = planned(aList(aLine({ group })))
    expect(open(plan)).toEqual(asked)
    expect(plan.questions[0]?.likely ?? null).toBe(likely)
  })

  test('answered it is that group, or a new one', () => {
    const bytes = aList(aLine({ group: 'Beginners' }))
    expect(planned(bytes, { answers: { 'group:beginners': 'is:Novice' } }).plan.add[0]?.group).toBe('Novice')
    expect(planned(bytes, { answers: { 'group:beginners': 'new' } }).plan.add[0]?.group).toBe('Beginners')
  })

  test('at an event without groups those of many rows are taken, the odd one is asked', () => {
    const lines = ['1', '2', '3'].map((number) => aLine({ number, plate: `AA${number}`, group: 'Slow' }))
    expect(open(planned(aList(...lines, second({ group: 'Slo' })), { groups: [] }))).toEqual(['group:slo'])
  })
})

describe('fleets and instructors', () => {
  const head = `${HEAD},Role,Team`
  const fleet = (...lines: readonly string[]) => new TextEncoder().encode([head, ...lines].join('\n'))
  const hired = `${aLine()},driver,Corvane Hire`
  const other = `${second()},,Corvane Hire`
  const spare = '90,,,,,Tarn 2,grey,SP 1,spare,1,,spare,Corvane Hire'

  test('a spare car is an entry of its own: who may drive it and with which group is asked', () => {
    const plan = planned(fleet(hired, other, spare))
    expect(open(plan)).toEqual(['spare:4', 'spare-group:4'])
    expect(plan.plan.add).toHaveLength(2)
    const told = planned(fleet(hired, other, spare), { answers: { 'spare:4': 'team', 'spare-group:4': 'is:Novice' } })
    expect(cars(told)[2]).toBe('90 SP 1: Ada Norcott + Bo Lind')
    expect(told.people.all).toHaveLength(2)
    expect(told.plan.add[2]).toMatchObject({ group: 'Novice', note: 'Of Corvane Hire' })
  })

  test('a spare car without anybody yet is possible, and its words say what that means', () => {
    const { questions } = planned(fleet(spare), { answers: { 'spare:2': 'nobody', 'spare-group:2': 'is:Novice' } })
    expect(questions[0]?.does).toContain('HOLD')
  })

  test('an instructor is put into each car that the row names', () => {
    const plan = planned(fleet(hired, other, '7 / 8,Ina,Stone,,,,,,,,,instructor,'))
    expect(cars(plan)).toEqual(['7 GF90 VGN: Ada Norcott + Ina Stone (instructor)', '8 BB22 BBB: Bo Lind + Ina Stone (instructor)'])
    expect(plan.people.all).toHaveLength(3)
  })

  test('an instructor without a car is asked about; a car that is not there is a problem', () => {
    const bytes = fleet(hired, other, ',Ina,Stone,,,,,,Novice,,,instructor,')
    expect(open(planned(bytes))).toEqual(['aboard:4'])
    expect(cars(planned(bytes, { answers: { 'aboard:4': 'group' } }))[1]).toContain('Ina Stone (instructor)')
    expect(open(planned(bytes, { answers: { 'aboard:4': 'numbers=7 99' } }))).toEqual(['aboard:4'])
    expect(planned(fleet(hired, '99,Ina,Stone,,,,,,,,,instructor,')).problems).toMatchObject([{ row: 3, column: 'entry number' }])
  })

  test('a second driver in a column of its own shares the car', () => {
    const bytes = new TextEncoder().encode(`${HEAD},Second driver\n${aLine()},Bo Lind`)
    expect(cars(planned(bytes))).toEqual(['7 GF90 VGN: Ada Norcott + Bo Lind'])
  })

  test('a role nobody knows is a problem of its cell', () => {
    expect(planned(fleet(`${aLine()},wizard,`)).problems).toMatchObject([{ row: 2, column: 'role', value: 'wizard' }])
  })
})

describe('against what is there', () => {
  const here = (said: Partial<ExistingEntry> = {}): ExistingEntry => ({
    id: 'e1',
    number: '7',
    plate: 'GF90 VGN',
    model: 'Tessier Petite',
    colour: 'red',
    group: 'Novice',
    passengerSeats: 1,
    note: 'quiet',
    people: [{ id: 'p1', name: 'Ada Norcott', email: 'ada@example.org', mobile: '', role: 'driver' }],
    hasRecords: false,
    ...said,
  })

  test('the same list changes nothing', () => {
    expect(planned(aList(aLine()), { existing: [here()] }).plan).toMatchObject({
      add: [],
      change: [],
      unchanged: 1,
      problems: [],
      notInList: 0,
    })
  })

  test('a shared car that is entered already is not asked about again', () => {
    const people = [...here().people, { id: 'p2', name: 'Bo Lind', email: 'bo@example.org', mobile: '', role: 'driver' as const }]
    const plan = planned(aList(aLine(), second({ plate: 'GF90 VGN' })), { existing: [here({ people })] })
    expect([open(plan), plan.plan.unchanged]).toEqual([[], 1])
  })

  test.each([
    ['another plate under the number', aLine({ plate: 'ZZ99 ZZZ' }), { 'entry:2': 'list' }, { fields: ['plate'] }],
    ['another number on the plate', aLine({ number: '70' }), { 'entry:2': 'renumber' }, { fields: ['number'] }],
  ])('%s is asked; the answer changes it', (_, line, answers, change) => {
    expect(open(planned(aList(line), { existing: [here()] }))).toEqual(['entry:2'])
    expect(planned(aList(line), { existing: [here()], answers }).plan.change).toMatchObject([change])
    expect(planned(aList(line), { existing: [here()], answers: { 'entry:2': 'leave-out' } }).plan.change).toEqual([])
  })

  test('another driver takes the place of the one before; somebody added by hand stays', () => {
    const people = [...here().people, { id: 'p9', name: 'Ina Stone', email: '', mobile: '', role: 'instructor' as const }]
    const plan = planned(aList(aLine({ firstName: 'Olof', email: 'olof@example.org' })), { existing: [here({ people })] })
    expect(plan.plan.change).toMatchObject([{ fields: ['people'], people: { remove: ['p1'], add: [{ role: 'driver' }] } }])
  })

  test('an entry that was looked at is no longer changed by a list', () => {
    const plan = planned(aList(aLine({ note: 'loud' })), { existing: [here({ hasRecords: true })] })
    expect(plan.problems).toMatchObject([{ row: 2, value: '7' }])
    expect(planned(aList(aLine()), { existing: [here({ hasRecords: true })] }).problems).toEqual([])
  })
})

test('the messy list asks six things, and answered whole it adds what is left', () => {
  const asked = planned(fixture('entries-messy'))
  expect(open(asked)).toEqual(['group:inter', 'group:adv.', 'group:beginners', 'row:10', 'row:26', 'row:100'])
  const plan = planned(fixture('entries-messy'), {
    choices: {
      corrections: [
        { row: 7, column: 'email', value: '' },
        { row: 20, column: 'number', value: '21' },
        { row: 21, column: 'passengerSeats', value: '1' },
        { row: 22, column: 'passengerSeats', value: '0' },
        { row: 29, column: 'model', value: 'Tarn 2' },
        { row: 30, column: 'note', value: 'long story' },
      ],
    },
    answers: {
      'group:inter': 'is:Intermediate',
      'group:adv.': 'is:Advanced',
      'group:beginners': 'is:Novice',
      'row:10': 'two-cars=61',
      'row:26': 'shared',
      'row:100': 'leave-out',
    },
  })
  expect([plan.problems, open(plan)]).toEqual([[], []])
  expect(plan.plan.add).toHaveLength(95)
  expect(plan.people.all).toHaveLength(96)
  expect(new Set(plan.plan.add.map(({ group }) => group))).toEqual(new Set(GROUPS))
})

test('cells that a spreadsheet would run are written with a quote before them', () => {
  expect(csvText([['=1+1', '+44', '-3', '@x', -3, 'a,b', 'a"b', '\t=x', ' =x']])).toBe(
    `\uFEFF'=1+1,'+44,'-3,'@x,-3,"a,b","a""b","'\t=x",' =x\r\n`,
  )
})
