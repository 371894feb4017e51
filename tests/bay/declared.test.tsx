import { screen, waitFor } from '@testing-library/react'
import { eq, sql } from 'drizzle-orm'
import { describe, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import { DECLARATION_WORDS, NOTHING_DECLARED, type SignedDeclaration } from '@/lib/contracts/declaration'
import { newId } from '@/lib/platform/ids'
import { aBay, aHarnessBay, type Bay, pick } from './a-bay'

const LABEL = { standard: 'fia-8853-2016', labelYear: 2028, labelsComplete: 'yes', labelsSameNumber: 'yes' }

/** The entrant signs a version, and the bay hears of it. */
async function declares(bay: Bay, version: number, parts: Partial<SignedDeclaration['parts']>): Promise<void> {
  bay.paddock.change((database) => {
    const own = database.select().from(tables.entry).where(eq(tables.entry.id, bay.car)).get()
    if (!own) throw new Error('the paddock has no such car')
    const { checklistHash: checklist, limitsHash: limits } = database.select().from(tables.event).get() ?? {
      checklistHash: '',
      limitsHash: '',
    }
    const signedBy = { accountId: newId(), name: 'Ida Rook' }
    const body: SignedDeclaration = { parts: { ...NOTHING_DECLARED, ...parts }, checklist, limits, signedBy, words: DECLARATION_WORDS }
    const row = { id: newId(), clubId: own.clubId, entryId: own.id, version, body, signedAt: bay.paddock.time.now }
    database.insert(tables.declaration).values(row).run()
    database
      .update(tables.event)
      .set({ snapshotVersion: sql`${tables.event.snapshotVersion} + 1` })
      .run()
  })
  await bay.phone.day.loadDay()
}

describe('what the entrant declared', () => {
  test('stands beside the check, with its unit and its year, and is never filled in as an answer', async () => {
    const bay = await aHarnessBay()
    await declares(bay, 1, { answers: { 'harness.label': LABEL } })
    bay.open(`/bay/car/${bay.car}/cabin`)
    await pick(bay, /harness labels/)

    expect(await screen.findByText(/^FIA 8853-2016, 2028, a readable label on every strap: yes/)).toBeVisible()
    expect(screen.getByRole('combobox', { name: 'Standard on the label' })).toHaveValue('')
    expect(screen.getByRole('button', { name: 'Seen so' })).toBeDisabled()
  })

  test('nothing is said of it where nothing was declared', async () => {
    const bay = await aHarnessBay()
    bay.open(`/bay/car/${bay.car}/cabin`)
    await pick(bay, /harness labels/)

    expect(await screen.findByRole('combobox', { name: 'Standard on the label' })).toBeVisible()
    expect(screen.queryByText(/Declared/)).toBeNull()
  })

  test('facts are offered when it is presented, what the organiser knows before what is declared', async () => {
    const bay = await aBay()
    await declares(bay, 1, { facts: { cage: true, slicks: true, wings: 'big' } })
    bay.open()
    await bay.press('Begin the walk')

    // The paddock's entry is known to have neither: that stands.
    await waitFor(() => expect(bay.state().presentedHeads[0]?.record.facts).toMatchObject({ cage: false, slicks: false }))
    expect(bay.state().presentedHeads[0]?.record.declaration).toMatchObject({ version: 1 })
  })

  test('declared after it was presented, the car says so with the time; presented anew it pins the newer one', async () => {
    const bay = await aBay()
    await declares(bay, 1, {})
    bay.open()
    await bay.press('Begin the walk')
    await screen.findByRole('navigation', { name: 'Places' })
    expect(screen.queryByText(/after it was presented/)).toBeNull()

    await declares(bay, 2, { changes: 'Front pads' })
    expect(await screen.findByText(/Declared again at \d\d:\d\d, after it was presented/)).toBeVisible()
    await bay.press('The car is otherwise than said')
    await bay.press('Begin the walk')
    await waitFor(() => expect(bay.state().presentedHeads.map(({ record }) => record.declaration?.version)).toEqual([2]))
    expect(screen.queryByText(/after it was presented/)).toBeNull()
  })
})
