import 'server-only'
import { eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { device, devicePerson } from '@/db/schema'
import type { Role } from '@/lib/permissions/policy'
import type { DeviceActor } from './actor'
import { personRoles } from './person-roles'

/** An enrolled device with its people, and which of their enrolled roles still stand; null when there is none of this id. */
export function deviceActor(database: Db, deviceId: string): DeviceActor | null {
  const row = database.select().from(device).where(eq(device.id, deviceId)).get()
  if (!row) return null
  const people = database.select().from(devicePerson).where(eq(devicePerson.deviceId, deviceId)).all()
  return {
    kind: 'device',
    deviceId: row.id,
    clubId: row.clubId,
    eventId: row.eventId,
    kid: row.kid,
    publicKey: row.publicKey,
    state: row.state,
    lastGoodSeq: row.lastGoodSeq,
    people: people.map(({ personId, roles }) => {
      const enrolledRoles = roles as readonly Role[]
      const standing = personRoles(database, personId)
      return { personId, enrolledRoles, roles: enrolledRoles.filter((role) => standing.includes(role)) }
    }),
  }
}
