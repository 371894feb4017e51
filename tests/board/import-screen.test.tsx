import { cleanup, fireEvent, render, screen, waitFor, within } from '@testing-library/react'
import { afterEach, describe, expect, test, vi } from 'vitest'
import { ImportScreen } from '@/app/(organiser)/events/[event]/import/_import/import-screen'
import { answering } from './answers'

const EVENT = '019a2303-0192-7bb3-8a50-6041506fb36e'
const LIST = 'Entry No,Surname,Car,Reg,Group\n47,Penhale,Halden,GF90 VGN,Novice\n'
const base64 = (content: string | Uint8Array) => Buffer.from(content).toString('base64')
const column = (index: number, heading: string, is: string | null, sure = 'sure') => ({
  index,
  heading,
  column: is,
  sure,
  samples: ['47', '48', '49'],
})
const PLAN = {
  committed: false,
  encoding: 'utf-8',
  separator: ',',
  headingRow: 1,
  columns: [column(0, 'Entry No', 'number'), column(1, 'Garage', null, 'unknown')],
  columnsNeeded: false,
  rowCount: 3,
  added: 2,
  changed: 1,
  unchanged: 0,
  people: 3,
  notInList: 4,
  changes: [{ number: '9', fields: ['model'] }],
  questions: [] as unknown[],
  questionCount: 0,
  openQuestions: 0,
  problems: [] as unknown[],
  problemCount: 0,
  remarks: [{ row: 9, words: 'A line of totals: no entry, passed over.' }],
  remarkCount: 1,
  newGroups: ['Drift'],
  planHash: 'plan-1',
  tookMs: 4,
}
const NOTHING = { encoding: null, headingRow: null, columns: null, corrections: [], leftOut: [] }
const QUESTION = {
  id: 'row:3',
  asks: 'Row 3 has plate SP53 NLL, as row 2 has. What are they?',
  rows: [{ row: 2, number: '189', plate: 'SP53 NLL', name: 'Dagny Varga', model: 'Tessier Petite' }],
  options: [
    { value: 'shared', words: 'They share one car: one entry with two drivers', asks: null },
    { value: 'two-cars', words: 'They are two cars; the second one’s number is', asks: 'Number of the second car' },
  ],
  likely: 'shared',
  answer: null as unknown,
  does: '',
}

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

function choose(content: BlobPart = LIST, name = 'entries.csv') {
  render(<ImportScreen eventId={EVENT} />)
  fireEvent.change(screen.getByLabelText('Choose an entry list'), { target: { files: [new File([content], name)] } })
}

describe('importing an entry list', () => {
  test('the dry run comes by itself, writes nothing, and says what would happen', async () => {
    const asked = answering({ ok: PLAN })
    choose()

    expect(await screen.findByRole('button', { name: 'Import 3 entries' })).toBeEnabled()
    expect(asked.map(({ body }) => body)).toEqual([
      { fileName: 'entries.csv', base64: base64(LIST), choices: NOTHING, answers: [], dryRun: true, planHash: '' },
    ])
    expect(screen.getByText('New run groups: Drift. They have no first session yet.')).toBeVisible()
    expect(screen.getByText('4 entries of this event are not in this list. They stay as they are.')).toBeVisible()
    expect(screen.getByText(/A line of totals/)).toBeVisible()
    expect(screen.getByText(`${LIST.length} bytes, 3 rows. Nothing has been written.`)).toBeVisible()
  })

  test('the button imports exactly what the dry run saw, and what happened is announced', async () => {
    const asked = answering({ ok: PLAN }, { ok: { ...PLAN, committed: true } })
    choose()
    fireEvent.click(await screen.findByRole('button', { name: 'Import 3 entries' }))

    expect(await screen.findByText('entries.csv is imported: 2 entries added, 1 changed, 0 as they were.')).toBeVisible()
    expect(asked[1]?.body).toMatchObject({ dryRun: false, planHash: 'plan-1', base64: base64(LIST) })
  })

  test('with one problem there is no button; row, column, value and why are named', async () => {
    const problem = { row: 7, column: 'plate', value: 'ZZ', why: 'A plate is up to 12 letters.' }
    answering({ ok: { ...PLAN, problems: [problem], problemCount: 1 } })
    choose()

    expect(await screen.findByText('1 problem in entries.csv: nothing can be imported yet.')).toBeVisible()
    expect(screen.queryByRole('button', { name: /^Import/ })).toBeNull()
    const row = within(screen.getByRole('table', { name: 'Problems' })).getByRole('row', { name: /7/ })
    expect(row).toHaveTextContent('7plateZZA plate is up to 12 letters.')
  })

  test('entries that changed meanwhile: nothing is imported, and it is looked through again', async () => {
    const stale = {
      status: 409,
      code: 'import-stale',
      what: 'The entries changed.',
      kept: 'Nothing was imported.',
      todo: 'Look again.',
    } as const
    const asked = answering({ ok: PLAN }, { problem: stale }, { ok: { ...PLAN, planHash: 'plan-2' } })
    choose()
    fireEvent.click(await screen.findByRole('button', { name: 'Import 3 entries' }))
    expect(await screen.findByText('The entries changed.')).toBeVisible()
    expect(screen.getByText('Nothing was imported. What you answered is still here.')).toBeVisible()

    fireEvent.click(screen.getByRole('button', { name: 'Look it through again' }))

    await waitFor(() => expect(screen.queryByText('The entries changed.')).toBeNull())
    expect(asked[2]?.body).toMatchObject({ dryRun: true })
  })

  test('without a network nothing is lost: the same list is looked through again by one press', async () => {
    answering('no network', { ok: PLAN })
    choose()
    fireEvent.click(await screen.findByRole('button', { name: 'Look it through again' }))

    expect(await screen.findByRole('button', { name: 'Import 3 entries' })).toBeEnabled()
  })

  test.each<[string, BlobPart, RegExp]>([
    ['a spreadsheet’s own file', new Uint8Array([0x50, 0x4b, 0x03, 0x04, 0, 0]), /This is a spreadsheet’s own file/],
    ['a file too large', 'x'.repeat(5_300_000), /5\.3 MB; 5\.2 MB is the most/],
  ])('%s is refused before anything is sent', async (_, content, words) => {
    const asked = answering({ ok: PLAN })
    choose(content)

    expect(await screen.findByRole('alert')).toHaveTextContent(words)
    expect(asked).toEqual([])
  })

  test('the bytes go as they are: what they mean is not guessed here', async () => {
    const asked = answering({ ok: PLAN })
    const bytes = new Uint8Array([0x63, 0xe9, 0x92])
    choose(bytes)

    await screen.findByRole('button', { name: 'Import 3 entries' })
    expect(asked[0]?.body).toMatchObject({ base64: base64(bytes) })
  })
})

describe('what only the organiser knows', () => {
  test('an open question takes no answer by itself; the one given goes with the next dry run, and says what it does', async () => {
    const answer = { id: 'row:3', value: 'two-cars', text: '84' }
    const open = { ...PLAN, questions: [QUESTION], questionCount: 1, openQuestions: 1 }
    const told = { ...open, questions: [{ ...QUESTION, answer, does: 'Number 84 is an entry of its own.' }], openQuestions: 0 }
    const asked = answering({ ok: open }, { ok: told })
    choose()

    expect(await screen.findByRole('heading', { name: '1 question' })).toBeVisible()
    expect(screen.getAllByRole('radio').filter((radio) => (radio as HTMLInputElement).checked)).toEqual([])
    expect(screen.queryByRole('button', { name: /^Import/ })).toBeNull()
    fireEvent.click(screen.getByRole('radio', { name: /They are two cars/ }))
    fireEvent.change(screen.getByLabelText('Number of the second car'), { target: { value: '84' } })
    fireEvent.click(screen.getByRole('button', { name: 'Look it through with these answers' }))

    expect(await screen.findByText('Number 84 is an entry of its own.')).toBeVisible()
    expect(asked[1]?.body).toMatchObject({ dryRun: true, answers: [answer] })
    expect(screen.getByRole('button', { name: 'Import 3 entries' })).toBeEnabled()
  })

  test('an answer changed after the dry run takes the import button away until it is looked through again', async () => {
    const answer = { id: 'row:3', value: 'shared', text: '' }
    answering({ ok: { ...PLAN, questions: [{ ...QUESTION, answer, does: 'They share.' }], questionCount: 1 } })
    choose()
    await screen.findByRole('button', { name: 'Import 3 entries' })
    fireEvent.click(screen.getByRole('radio', { name: /They are two cars/ }))

    expect(screen.queryByRole('button', { name: /^Import/ })).toBeNull()
  })

  test('a cell put right and a row left out go with the next dry run', async () => {
    const problem = { row: 7, column: 'e-mail', value: 'not-an-address', why: 'This is not an e-mail address.' }
    const asked = answering({ ok: { ...PLAN, problems: [problem, { ...problem, row: 8 }], problemCount: 2 } }, { ok: PLAN })
    choose()
    fireEvent.change(await screen.findByLabelText('Row 7, e-mail, put right'), { target: { value: 'ada@example.org' } })
    fireEvent.click(screen.getByLabelText('Leave row 8 out'))
    fireEvent.click(screen.getByRole('button', { name: 'Look it through with these answers' }))

    await screen.findByRole('button', { name: 'Import 3 entries' })
    expect(asked[1]?.body).toMatchObject({
      choices: { corrections: [{ row: 7, column: 'email', value: 'ada@example.org' }], leftOut: [8] },
    })
  })

  test('columns that are not sure are shown with three cells, and read only once they are said', async () => {
    const columns = [column(0, 'Entry No', 'number'), column(1, 'Tel', 'mobile', 'likely'), column(2, 'Phone', null, 'likely')]
    const asked = answering({ ok: { ...PLAN, columns, columnsNeeded: true } }, { ok: PLAN })
    choose()

    expect(await screen.findByText('Say what the columns are')).toBeVisible()
    expect(screen.queryByRole('button', { name: /^Import/ })).toBeNull()
    expect(screen.getAllByText('47 · 48 · 49')).toHaveLength(3)
    fireEvent.change(screen.getByLabelText('Column 3, Phone, is the'), { target: { value: 'mobile' } })
    expect(screen.getByText('Two columns are the mobile. Leave one of them.')).toBeVisible()
    fireEvent.change(screen.getByLabelText('Column 2, Tel, is the'), { target: { value: '' } })
    fireEvent.click(screen.getByRole('button', { name: 'Read it with these columns' }))

    await screen.findByRole('button', { name: 'Import 3 entries' })
    expect(asked[1]?.body).toMatchObject({ choices: { columns: ['number', null, 'mobile'] } })
  })
})
