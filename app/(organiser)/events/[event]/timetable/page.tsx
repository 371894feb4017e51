import type { Metadata } from 'next'
import { readTimetable } from '@/lib/events/queries/see-timetable'
import { can } from '@/lib/permissions/policy'
import { servedDatabase } from '@/lib/platform/served-database'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { TimetableScreen } from './_timetable/timetable-screen'

export const metadata: Metadata = { title: 'Timetable' }

export default async function TimetablePage({ params }: { readonly params: Promise<{ event: string }> }) {
  const guarded = await guardEvent((await params).event, 'timetable', 'event:see')
  const timetable = readTimetable(servedDatabase(), guarded.event)
  return (
    <EventFrame guarded={guarded} tab="timetable">
      <TimetableScreen eventId={guarded.event.id} timetable={timetable} mayEdit={can(guarded.roles, 'event:edit')} />
    </EventFrame>
  )
}
