import 'server-only'
import { and, asc, eq, gt } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { device } from '@/db/schema'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { DeviceView, listDevices } from '@/lib/contracts/devices'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { ownEvent } from '@/lib/platform/own-event'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { peopleOf } from './people-of'

/** Every device ever enrolled for the event, by its number. The server's own, number 0, is nobody's to take out of use and is not among them. */
export function seeDevices(
  { params }: InputOf<typeof listDevices>,
  actor: AccountActor,
  { database }: Pick<Deps, 'database'>,
): OutputOf<typeof listDevices> | Refusal {
  const event = ownEvent(database, actor, params.event)
  if (!event) return refuse('missing')
  const rows = database
    .select()
    .from(device)
    .where(and(eq(device.eventId, event.id), gt(device.kid, 0)))
    .orderBy(asc(device.kid))
    .all()
  return { devices: rows.map((row) => deviceView(database, row)) }
}

export function deviceView(database: Db, row: typeof device.$inferSelect): DeviceView {
  const { id, kid, name, state, enrolledAt, lastContactAt, unsent } = row
  const people = peopleOf(database, id).map((person) => ({ name: person.name, roles: person.roles }))
  return { id, kid, name, state, people, enrolledAt, lastContactAt, unsent }
}
