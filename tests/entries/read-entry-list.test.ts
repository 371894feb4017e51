import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { planImport, type ExistingEntry } from '@/lib/entries/plan-import'
import { readEntryList } from '@/lib/entries/read-entry-list'

const HEAD = 'Entry No,First name,Surname,E-mail,Mobile,Car,Colour,Reg,Group,Passengers,Notes'
const LINE = '7,Ada,Norcott,ada@example.org,+44 7700 900000,Tessier Petite,Red,gf90 vgn,Novice,1,quiet'

describe('reading a list', () => {
  test('the demo list of 142 is read whole and without a problem', () => {
    const list = readEntryList(readFileSync('tests/fixtures/entries-clean.csv', 'utf8'))
    expect(list.problems).toEqual([])
    expect(list.rows).toHaveLength(142)
    expect(list.rows[0]).toMatchObject({
      row: 2,
      number: '232',
      plate: 'GF90 VGN',
      model: 'Halden 1.6 hatch',
      group: 'Intermediate',
      note: 'hire car',
    })
  })

  test('007 is not 7', () => {
    const list = readEntryList(`${HEAD}\n${LINE}\n${LINE.replace('7,', '007,').replace('gf90 vgn', 'gf91 vgn')}`)
    expect(list.problems).toEqual([])
    expect(list.rows.map((row) => row.number)).toEqual(['7', '007'])
  })

  test('a problem names the row that the spreadsheet shows, with empty rows and broken lines above it', () => {
    const broken = LINE.replace('7,', ',').replace('gf90 vgn', 'gf91 vgn')
    const list = readEntryList(`\n${HEAD}\n\n${LINE.replace('quiet', '"quiet\non tyres"')}\n,,,,,,,,,,\n${broken}\n`)
    expect(list.problems).toMatchObject([{ row: 6, column: 'entry number' }])
    expect(list.rows).toMatchObject([{ row: 4, number: '7', note: 'quiet on tyres' }])
    expect(list.rowCount).toBe(2)
  })

  test('rows may end in several ways in one list', () => {
    const [second, third] = ['8', '9'].map((number) => LINE.replace('7,', `${number},`).replace('gf90 vgn', `gf9${number} vgn`))
    const list = readEntryList(`${HEAD}\r\n${LINE}\r\n${second}\n${third}\r`)
    expect(list.problems).toEqual([])
    expect(list.rows.map(({ row, number }) => [row, number])).toEqual([
      [2, '7'],
      [3, '8'],
      [4, '9'],
    ])
  })

  test.each([
    ['no number', LINE.replace('7,', ','), 'entry number'],
    ['a number with a sign', LINE.replace('7,', '7#,'), 'entry number'],
    ['an address that is none', LINE.replace('ada@example.org', 'not-an-address'), 'e-mail'],
    ['no plate', LINE.replace('gf90 vgn', ''), 'plate'],
    ['a plate that is a formula', LINE.replace('gf90 vgn', '=1+1'), 'plate'],
    ['passengers in words', LINE.replace(',1,', ',two,'), 'passengers'],
    ['a negative number of passengers', LINE.replace(',1,', ',-1,'), 'passengers'],
    ['no group', LINE.replace('Novice', ''), 'run group'],
    ['a cell too many', `${LINE},extra`, ''],
  ])('%s is refused with row and column, and the row is left out', (_, line, column) => {
    const list = readEntryList(`${HEAD}\n${line}`)
    expect(list.rows).toEqual([])
    expect(list.problems).toHaveLength(1)
    expect(list.problems[0]).toMatchObject({ row: 2, column })
    expect(list.problems[0]?.why).toMatch(/\S/)
  })

  test('all problems of a file are told at once', () => {
    const list = readEntryList(`${HEAD}\n${LINE.replace('7,', ',').replace('gf90 vgn', '')}\n${LINE.replace('Novice', '')}`)
    expect(list.problems.map((problem) => [problem.row, problem.column])).toEqual([
      [2, 'entry number'],
      [2, 'plate'],
      [3, 'run group'],
    ])
  })

  test('a repeated number and a repeated plate are asked about, never guessed from the notes', () => {
    const list = readEntryList(`${HEAD}\n${LINE}\n${LINE}\n${LINE.replace('7,', '8,').replace('gf90 vgn', 'GF90VGN')}`)
    expect(list.rows.map((row) => row.row)).toEqual([2])
    expect(list.problems.map((problem) => [problem.row, problem.column])).toEqual([
      [3, 'entry number'],
      [3, 'plate'],
      [4, 'plate'],
    ])
  })

  test.each([
    ['an empty file', ''],
    ['a file without the plate column', 'Entry No,Surname,Car,Group\n1,a,b,c'],
    ['two columns for one thing', `${HEAD},Registration\n${LINE},x`],
    ['an open quotation mark', `${HEAD}\n"${LINE}`],
    ['bytes that are no list', '\u0000\u0001\u0002'],
  ])('%s yields no row and says why', (_, text) => {
    const list = readEntryList(text)
    expect(list.rows).toEqual([])
    expect(list.problems.length).toBeGreaterThan(0)
  })
})

describe('planning an import', () => {
  const [row] = readEntryList(`${HEAD}\n${LINE}`).rows
  if (!row) throw new Error('the fixture line is a row')
  const known: ExistingEntry = { ...row, id: 'e1', name: 'Ada Norcott', hasRecords: false }

  test('the same list twice changes nothing', () => {
    expect(planImport([row], [known])).toEqual({ add: [], change: [], unchanged: 1, problems: [] })
  })

  test('a changed colour is a change; once the car has been looked at it is a problem', () => {
    expect(planImport([{ ...row, colour: 'blue' }], [known]).change).toMatchObject([{ fields: ['colour'] }])
    const after = planImport([{ ...row, colour: 'blue' }], [{ ...known, hasRecords: true }])
    expect(after.change).toEqual([])
    expect(after.problems).toMatchObject([{ row: 2, column: 'colour' }])
  })

  test('a number with another plate and a plate with another number are problems', () => {
    expect(planImport([{ ...row, plate: 'ZZ1 ZZZ' }], [known]).problems).toHaveLength(1)
    expect(planImport([{ ...row, number: '9' }], [known]).problems).toHaveLength(1)
  })
})
