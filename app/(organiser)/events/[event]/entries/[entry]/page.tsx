import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { readBoard } from '@/lib/board/queries/see-board'
import { readEntry } from '@/lib/entries/queries/see-entry'
import { can } from '@/lib/permissions/policy'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { dayReading } from '@/lib/sync/server/day-reading'
import { EventFrame } from '@/app/(organiser)/_frame/event-frame'
import { guardEvent } from '@/app/(organiser)/_frame/guard-event'
import { EntryScreen } from './_entry/entry-screen'

export const metadata: Metadata = { title: 'Entry' }

export default async function EntryPage({ params }: { readonly params: Promise<{ event: string; entry: string }> }) {
  const { event, entry } = await params
  const guarded = await guardEvent(event, `entries/${encodeURIComponent(entry)}`, 'entries:see')
  const seesContacts = can(guarded.roles, 'contacts:see')
  const view = readEntry(dayReading, servedDatabase(), guarded.event, entry, now(), seesContacts)
  const board = view === null ? null : readBoard(dayReading, servedDatabase(), guarded.event, now())
  const row = board?.rows.find(({ id }) => id === entry)
  if (view === null || board === null || row === undefined) notFound()
  return (
    <EventFrame guarded={guarded} tab="entries" width="wide">
      <EntryScreen view={view} row={row} stations={board.stations} timeZone={board.timeZone} mayEdit={can(guarded.roles, 'entries:edit')} />
    </EventFrame>
  )
}
