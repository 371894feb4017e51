import Link from 'next/link'
import { type Action, can, type Role } from '@/lib/permissions/policy'

export type EventTab = 'board' | 'holds' | 'timetable' | 'order' | 'entries' | 'import' | 'people' | 'devices' | 'mail' | 'report'

const TABS: readonly { readonly tab: EventTab; readonly label: string; readonly action: Action }[] = [
  { tab: 'board', label: 'Board', action: 'board:see' },
  { tab: 'holds', label: 'Holds', action: 'holds:see' },
  { tab: 'timetable', label: 'Timetable', action: 'event:see' },
  { tab: 'order', label: 'Bay order', action: 'order:see' },
  { tab: 'entries', label: 'Entries', action: 'entries:see' },
  { tab: 'import', label: 'Import', action: 'entries:import' },
  { tab: 'mail', label: 'Mail', action: 'mail:see' },
  { tab: 'report', label: 'Report', action: 'report:see' },
  { tab: 'people', label: 'People', action: 'crew:see' },
  { tab: 'devices', label: 'Devices', action: 'crew:see' },
]

/** The pages of an event that these roles may open. */
export function EventTabs({
  eventId,
  current,
  roles,
}: {
  readonly eventId: string
  readonly current: EventTab
  readonly roles: readonly Role[]
}) {
  return (
    <nav aria-label="Event" className="-mx-4 overflow-x-auto px-4 sm:mx-0 sm:px-0">
      <ul className="flex min-w-max border-b">
        {TABS.filter(({ action }) => can(roles, action)).map(({ tab, label }) => (
          <li key={tab}>
            <Link
              href={`/events/${eventId}/${tab}`}
              aria-current={tab === current ? 'page' : undefined}
              className="target heading flex items-center border-b-4 border-transparent px-2 pt-1 text-base aria-[current=page]:border-accent sm:px-5 sm:text-lg"
            >
              {label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  )
}
