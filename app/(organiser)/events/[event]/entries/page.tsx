import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { readBoard } from '@/lib/board/queries/see-board'
import { seeMissing } from '@/lib/entries/queries/see-missing'
import { can } from '@/lib/permissions/policy'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { dayReading } from '@/lib/sync/server/day-reading'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { DeclarationsSummary } from './_entries/declarations-summary'
import { EntriesScreen } from './_entries/entries-screen'

export const metadata: Metadata = { title: 'Entries' }

export default async function EntriesPage({ params }: { readonly params: Promise<{ event: string }> }) {
  const guarded = await guardEvent((await params).event, 'entries', 'entries:see')
  const board = readBoard(dayReading, servedDatabase(), guarded.event, now())
  if (board === null) notFound()
  return (
    <EventFrame guarded={guarded} tab="entries" width="wide">
      <DeclarationsSummary eventId={guarded.event.id} />
      <EntriesScreen
        eventId={guarded.event.id}
        first={board}
        missing={seeMissing(servedDatabase(), guarded.event.id)}
        mayImport={can(guarded.roles, 'entries:import')}
      />
    </EventFrame>
  )
}
