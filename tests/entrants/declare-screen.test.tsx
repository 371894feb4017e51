import { act, fireEvent, render, screen, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest'
import { DeclareScreen } from '@/app/(entrant)/entries/[entry]/declare/_declare/declare-screen'
import { NOTHING_DECLARED } from '@/lib/contracts/declaration'
import type { Declaring } from '@/lib/entrants/queries/declaring-of'
import { answering } from '../board/answers'
import { BOOK, CHECKS, FACTS, IDA } from './the-book'

const ENTRY = '019a2303-0192-7bb3-8a50-00000000e303'
const LABELS = 'A readable label on every strap, one set, in date'
const OLD = { standard: 'fia-8853-2016', labelYear: 2024, labelsComplete: 'yes', labelsSameNumber: 'yes' }

function aDeclaring(given: Partial<Declaring> = {}): Declaring {
  return {
    entry: { id: ENTRY, number: '303', plate: 'RE41 XDB', model: 'Brack 30 coupe', colour: 'turquoise' },
    event: { name: 'Marram', venue: 'Ottermere Ring', firstDay: '2026-05-09', lastDay: '2026-05-10', timeZone: 'Europe/London' },
    me: 'Ida Rook',
    facts: FACTS,
    checks: CHECKS,
    places: BOOK.checklist.places,
    stations: BOOK.checklist.stations,
    people: [{ id: IDA, name: 'Ida Rook' }],
    kit: [],
    start: { ...NOTHING_DECLARED, facts: { belts: 'harness', roof: 'closed' }, answers: { 'harness.label': OLD } },
    from: 'nothing',
    draftAt: null,
    before: null,
    signed: null,
    isPresented: false,
    ...given,
  }
}

const card = () => within(screen.getByRole('region', { name: LABELS }))
const passes = (ms: number) => act(() => vi.advanceTimersByTimeAsync(ms))

beforeEach(() => {
  vi.useFakeTimers()
  window.localStorage.clear()
})
afterEach(() => {
  vi.useRealTimers()
  vi.unstubAllGlobals()
})

describe('the declaration', () => {
  test('is judged at each key by the bay’s rule, with figure, limit, source and what to bring', () => {
    answering({ ok: { savedAt: 1 } })
    render(<DeclareScreen declaring={aDeclaring()} />)
    expect(card().getByText('As declared: would not be passed.')).toBeVisible()
    expect(card().getByText(/last valid day Tue 31 December 2024/)).toBeVisible()
    expect(card().getByText(/Bring belts/)).toBeVisible()
    expect(card().getByText('where the limit comes from')).toBeVisible()

    fireEvent.change(card().getByLabelText('FIA: not valid after'), { target: { value: '2028' } })
    expect(card().getByText('As declared: would be passed.')).toBeVisible()
  })

  test('says that nothing is passed here, whatever is declared', () => {
    answering({ ok: { savedAt: 1 } })
    render(<DeclareScreen declaring={aDeclaring()} />)

    expect(screen.getByText('Nothing is passed here.')).toBeVisible()
    expect(document.body.textContent).not.toMatch(/\bsafe\b/)
  })

  test('asks only what applies: with road belts the harness is gone', () => {
    answering({ ok: { savedAt: 1 } })
    render(<DeclareScreen declaring={aDeclaring()} />)
    fireEvent.click(screen.getByRole('radio', { name: 'Road belts' }))

    expect(screen.queryByRole('region', { name: LABELS })).toBeNull()
    expect(screen.queryByText('Head restraint worn with the harness')).toBeNull()
  })

  test('is saved by itself soon after a key, whole', async () => {
    const asked = answering({ ok: { savedAt: Date.UTC(2026, 4, 2, 18, 5) } })
    render(<DeclareScreen declaring={aDeclaring()} />)
    fireEvent.change(card().getByLabelText('FIA: not valid after'), { target: { value: '2028' } })
    expect(asked).toEqual([])
    await passes(1_000)

    expect(asked).toHaveLength(1)
    expect(asked[0]).toMatchObject({ method: 'PUT', url: `/api/my/entries/${ENTRY}/draft` })
    expect(asked[0]?.body).toMatchObject({
      parts: { facts: { belts: 'harness' }, answers: { 'harness.label': { ...OLD, labelYear: 2028 } } },
    })
    expect(screen.getByText(/^Saved at 19:05/)).toBeVisible()
    await passes(60_000)
    expect(asked).toHaveLength(1)
  })

  test('without a network it is kept on this phone, said so, sent again by itself, and then forgotten here', async () => {
    const asked = answering('no network', 'no network', { ok: { savedAt: 1 } })
    const { unmount } = render(<DeclareScreen declaring={aDeclaring()} />)
    fireEvent.change(card().getByLabelText('FIA: not valid after'), { target: { value: '2029' } })
    await passes(1_000)
    expect(screen.getByText(/What you typed is kept on this phone/)).toBeVisible()

    // The page is closed and opened again before there is any signal.
    unmount()
    render(<DeclareScreen declaring={aDeclaring()} />)
    await passes(1_000)
    expect(card().getByLabelText('FIA: not valid after')).toHaveValue('2029')

    await passes(12_000)
    expect(asked.length).toBeGreaterThanOrEqual(3)
    expect(screen.getByText(/^Saved at/)).toBeVisible()
    expect(window.localStorage.length).toBe(0)
  })

  test('is not signed without agreeing; what was filled in stays when the server is not reached', async () => {
    const asked = answering('no network')
    render(<DeclareScreen declaring={aDeclaring()} />)
    fireEvent.click(screen.getByRole('button', { name: 'Sign the declaration' }))
    await passes(10)
    expect(screen.getByText('Tick that you agree before you sign.')).toBeVisible()
    expect(asked).toEqual([])

    fireEvent.click(screen.getByRole('checkbox', { name: 'I agree.' }))
    fireEvent.click(screen.getByRole('button', { name: 'Sign the declaration' }))
    await passes(10)
    expect(asked.map(({ url }) => url)).toEqual([`/api/my/entries/${ENTRY}/declaration`])
    expect(screen.getByText('What you filled in is kept.')).toBeVisible()
    expect(card().getByLabelText('FIA: not valid after')).toHaveValue('2024')
  })

  test('one code typed is offered for the tyres that are empty, and never over one that is not', () => {
    answering({ ok: { savedAt: 1 } })
    render(<DeclareScreen declaring={aDeclaring()} />)
    const codes = within(screen.getByRole('region', { name: 'The date code is read and young enough' }))
    const [first, second, third] = codes.getAllByRole('textbox')
    fireEvent.change(first!, { target: { value: '2024' } })
    fireEvent.change(third!, { target: { value: '1118' } })
    fireEvent.click(codes.getByRole('button', { name: 'The same on the other 2' }))

    expect([first, second, third].map((field) => (field as HTMLInputElement).value)).toEqual(['2024', '2024', '1118'])
  })

  test('a change of a signed version names what the bay sees again', () => {
    answering({ ok: { savedAt: 1 } })
    const start = aDeclaring().start
    render(
      <DeclareScreen declaring={aDeclaring({ from: 'signed', signed: { version: 1, signedAt: 1, parts: start }, isPresented: true })} />,
    )
    expect(screen.getByText('Nothing is said otherwise than in version 1.')).toBeVisible()

    fireEvent.change(card().getByLabelText('FIA: not valid after'), { target: { value: '2028' } })
    expect(screen.getByText('Otherwise than in version 1: harness labels.')).toBeVisible()
    expect(screen.getByText(/^The bay looks again at: harness labels/)).toBeVisible()
    expect(screen.getByText(/The bay has begun to look at this car/)).toBeVisible()
  })
})
