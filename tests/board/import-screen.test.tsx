import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react'
import { afterEach, describe, expect, test, vi } from 'vitest'
import { ImportScreen } from '@/app/(organiser)/events/[event]/import/_import/import-screen'
import { answering } from './answers'

const EVENT = '019a2303-0192-7bb3-8a50-6041506fb36e'
const LIST = 'Entry No,Surname,Car,Reg,Group\n47,Penhale,Halden,GF90 VGN,Novice\n'
const PLAN = {
  committed: false,
  rowCount: 3,
  added: 2,
  changed: 1,
  unchanged: 0,
  addedNumbers: ['47', '48'],
  changes: [{ number: '9', fields: ['model'] }],
  problems: [],
  problemCount: 0,
  unusedHeadings: ['Garage'],
  newGroups: ['Drift'],
  planHash: 'plan-1',
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
    expect(asked.map(({ body }) => body)).toEqual([{ fileName: 'entries.csv', text: LIST, dryRun: true, planHash: '' }])
    expect(screen.getByText('New run groups: Drift. They have no first session yet.')).toBeVisible()
    expect(screen.getByText('Columns that are not used: Garage.')).toBeVisible()
    expect(screen.getByText(`${LIST.length} bytes, 3 rows. Nothing has been written.`)).toBeVisible()
  })

  test('the button imports exactly what the dry run saw, and what happened is announced', async () => {
    const asked = answering({ ok: PLAN }, { ok: { ...PLAN, committed: true } })
    choose()
    fireEvent.click(await screen.findByRole('button', { name: 'Import 3 entries' }))

    expect(await screen.findByText('entries.csv is imported: 2 entries added, 1 changed, 0 as they were.')).toBeVisible()
    expect(asked[1]?.body).toMatchObject({ dryRun: false, planHash: 'plan-1', text: LIST })
  })

  test('with one problem there is no button; row, column, value and why are named', async () => {
    const problem = { row: 7, column: 'plate', value: 'ZZ', why: 'A plate is up to 12 letters.' }
    answering({ ok: { ...PLAN, problems: [problem], problemCount: 1 } })
    choose()

    expect(await screen.findByText('1 problem in entries.csv: nothing can be imported yet.')).toBeVisible()
    expect(screen.queryByRole('button', { name: /^Import/ })).toBeNull()
    const row = screen.getByRole('row', { name: /7/ })
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
    expect(await screen.findByRole('alert')).toHaveTextContent('The entries changed.Nothing was imported.Look again.')

    fireEvent.click(screen.getByRole('button', { name: 'Look it through again' }))

    await waitFor(() => expect(screen.queryByRole('alert')).toBeNull())
    expect(asked[2]?.body).toMatchObject({ dryRun: true })
  })

  test('without a network nothing is lost: the same list is looked through again by one press', async () => {
    answering('no network', { ok: PLAN })
    choose()
    fireEvent.click(await screen.findByRole('button', { name: 'Look it through again' }))

    expect(await screen.findByRole('button', { name: 'Import 3 entries' })).toBeEnabled()
  })

  test.each<[string, BlobPart, RegExp]>([
    ['a spreadsheet’s own file', new Uint8Array([0x50, 0x4b, 0x03, 0x04, 0, 0]), /This is not a text file/],
    ['a file too large', 'x'.repeat(7_300_000), /7\.3 MB; 7\.2 MB is the most/],
  ])('%s is refused before anything is sent', async (_, content, words) => {
    const asked = answering({ ok: PLAN })
    choose(content)

    expect(await screen.findByRole('alert')).toHaveTextContent(words)
    expect(asked).toEqual([])
  })

  test.each([
    ['UTF-16 with its mark', new Uint8Array([0xff, 0xfe, 0xe9, 0x00]), 'é'],
    ['Windows-1252', new Uint8Array([0x63, 0xe9]), 'cé'],
    ['UTF-8', new TextEncoder().encode('cé'), 'cé'],
  ])('a list in %s is read as it was meant', async (_, bytes, text) => {
    const asked = answering({ ok: PLAN })
    choose(bytes)

    await screen.findByRole('button', { name: 'Import 3 entries' })
    expect(asked[0]?.body).toMatchObject({ text })
  })
})
