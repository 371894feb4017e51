import 'server-only'
import { asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { devicePerson, person } from '@/db/schema'
import type { Role } from '@/lib/permissions/policy'

/** The people of a device, by name, with the roles they were certified for. */
export function peopleOf(database: Db, deviceId: string): { id: string; name: string; roles: Role[] }[] {
  return database
    .select({ id: person.id, name: person.name, roles: devicePerson.roles })
    .from(devicePerson)
    .innerJoin(person, eq(person.id, devicePerson.personId))
    .where(eq(devicePerson.deviceId, deviceId))
    .orderBy(asc(person.name), asc(person.id))
    .all()
    .map((row) => ({ ...row, roles: row.roles as Role[] }))
}
