import type { Metadata } from 'next'
import Link from 'next/link'
import { buttonClass } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { PageFrame } from '@/app/_ui/page-frame'
import { myEvents } from '@/lib/accounts/queries/describe-me'
import { can } from '@/lib/permissions/policy'
import { servedDatabase } from '@/lib/platform/served-database'
import { guardAccount } from '../_frame/guard-event'
import { OfficeBar } from '../_frame/office-bar'
import { EventList } from './event-list'

export const metadata: Metadata = { title: 'Events' }

export default async function EventsPage() {
  const account = await guardAccount('/events')
  const events = myEvents(servedDatabase(), account)
  return (
    <PageFrame title="Events" width="text" navigation={<OfficeBar name={account.name} />}>
      {can(account.clubRoles, 'event:edit') && (
        <p className="pb-6">
          <Link href="/events/new" className={buttonClass('secondary')}>
            New event
          </Link>
        </p>
      )}
      {events.length === 0 ? (
        <EmptyState title="No event has you in its crew">
          When an organiser adds you to an event’s crew it appears here. On the day itself, scan the join code that the organiser shows.
        </EmptyState>
      ) : (
        <EventList events={events} />
      )}
    </PageFrame>
  )
}
