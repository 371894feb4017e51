import 'server-only'
import { eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { event } from '@/db/schema'
import { can, type Role } from '@/lib/permissions/policy'
import type { AccountActor } from '@/lib/platform/actor'
import { venueDay } from '@/lib/rules/venue-day'
import { nearestEvent } from '../nearest-event'
import { myEvents } from './describe-me'

/** Where somebody's work is once they are signed in: the board for who runs the event, bay, sign-on or pit exit for its crew. */
export function landingPath(database: Db, actor: AccountActor, now: number): string {
  const zones = new Map(
    database
      .select({ id: event.id, timeZone: event.timeZone })
      .from(event)
      .where(eq(event.clubId, actor.clubId))
      .all()
      .map(({ id, timeZone }) => [id, timeZone]),
  )
  const events = myEvents(database, actor).map((own) => ({ ...own, today: venueDay(now, zones.get(own.id) ?? 'UTC') }))
  const nearest = nearestEvent(events)
  if (nearest) return placeOf(nearest.roles, nearest.id)
  return can(actor.clubRoles, 'event:see') ? '/events' : '/cars'
}

function placeOf(roles: readonly Role[], eventId: string): string {
  if (can(roles, 'event:edit')) return `/events/${eventId}/board`
  const crew = roles.filter((role) => role !== 'entrant')
  if (crew.every((role) => role === 'marshal')) return '/pit-exit'
  return crew.every((role) => role === 'sign-on') ? '/sign-on' : '/bay'
}
