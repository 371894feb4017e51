import type { Metadata } from 'next'
import { can } from '@/lib/permissions/policy'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { PeopleScreen } from './_people/people-screen'

export const metadata: Metadata = { title: 'People' }

export default async function PeoplePage({ params }: { readonly params: Promise<{ event: string }> }) {
  const guarded = await guardEvent((await params).event, 'people', 'crew:see')
  const { event, roles } = guarded
  return (
    <EventFrame guarded={guarded} tab="people">
      <PeopleScreen
        eventId={event.id}
        timeZone={event.timeZone}
        mayInvite={can(roles, 'join-code:make')}
        mayDecide={can(roles, 'crew:accept')}
      />
    </EventFrame>
  )
}
