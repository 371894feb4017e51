import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { dayReading } from '@/lib/sync/server/day-reading'
import { readEventHolds } from '@/lib/holds/queries/see-holds'
import { can } from '@/lib/permissions/policy'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { HoldsScreen } from './_holds/holds-screen'

export const metadata: Metadata = { title: 'Holds' }

export default async function HoldsPage({ params }: { readonly params: Promise<{ event: string }> }) {
  const guarded = await guardEvent((await params).event, 'holds', 'holds:see')
  const holds = readEventHolds(dayReading, servedDatabase(), guarded.event, now())
  if (holds === null) notFound()
  return (
    <EventFrame guarded={guarded} tab="holds">
      <HoldsScreen eventId={guarded.event.id} first={holds} mayVoid={can(guarded.roles, 'record:void')} />
    </EventFrame>
  )
}
