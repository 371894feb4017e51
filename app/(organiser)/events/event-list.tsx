import Link from 'next/link'
import type { AnswerOf } from '@/lib/contracts/contract'
import type { me } from '@/lib/contracts/me'
import { daysInWords } from '../_frame/event-frame'

/** Events with what one is at each; the whole line leads to its board. */
export function EventList({ events }: { readonly events: AnswerOf<typeof me>['events'] }) {
  return (
    <ul className="border-t">
      {events.map((event) => (
        <li key={event.id} className="border-b">
          <Link href={`/events/${event.id}/board`} className="target block py-3">
            <span className="heading block text-xl text-accent underline underline-offset-4">{event.name}</span>
            <span className="block">
              {event.venue} · {daysInWords(event)}
            </span>
            <span className="block text-muted">You are {event.roles.length === 0 ? 'no crew' : event.roles.join(', ')} here</span>
          </Link>
        </li>
      ))}
    </ul>
  )
}
