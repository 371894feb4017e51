import 'server-only'
import { and, eq, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { device, devicePerson, event as eventTable, person } from '@/db/schema'
import { CERTIFICATE_TYPE, type DeviceCertificate } from '@/lib/contracts/device-certificate'
import { CREW_ROLES, type Role } from '@/lib/permissions/policy'
import type { AccountActor, DeviceActor } from '@/lib/platform/actor'
import { assert } from '@/lib/platform/assert'
import { deviceActor } from '@/lib/platform/device-actor'
import { signJws } from '@/lib/platform/jws'
import { personOfAccount } from '@/lib/platform/person-of-account'
import { rolesAt } from '@/lib/platform/roles-at'
import { serverKey } from '@/lib/platform/server-key'
import { sha256 } from '@/lib/platform/sha256'

/** The server is one more device of every event: number 0, never reused, never retired. */
export const SERVER_KID = 0

type Event = typeof eventTable.$inferSelect

/**
 * The server's own device at an event, enrolled for this account with the roles it holds there; made when first needed, inside the caller's transaction.
 * Its id follows from the event's, so that a restored server is the same device again and takes its own forgotten records back.
 */
export function serverDeviceFor(
  tx: Db,
  event: Event,
  actor: AccountActor,
  now: number,
): { readonly device: DeviceActor; readonly person: string } {
  const id = serverDeviceId(event.id)
  const personId = personOfAccount(tx, event, actor)
  const roles = rolesAt(tx, actor, event.id).filter((role) => role === 'organiser' || (CREW_ROLES as readonly Role[]).includes(role))
  if (!isEnrolled(tx, id, personId, roles)) enrolHere(tx, event, id, personId, roles, now)
  const made = deviceActor(tx, id)
  assert(made !== null, `the server's device of event ${event.id} was written and is not there`)
  return { device: made, person: personId }
}

/** A UUID (version 8, RFC 9562) out of the event's id. */
export function serverDeviceId(eventId: string): string {
  const hex = sha256(`server-device-v1\n${eventId}`)
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-8${hex.slice(13, 16)}-8${hex.slice(17, 20)}-${hex.slice(20, 32)}`
}

function isEnrolled(tx: Db, id: string, personId: string, roles: readonly Role[]): boolean {
  const row = tx
    .select({ roles: devicePerson.roles })
    .from(devicePerson)
    .where(and(eq(devicePerson.deviceId, id), eq(devicePerson.personId, personId)))
    .get()
  // What was certified once stays so: a role that ended is taken off when the record is judged.
  return row !== undefined && roles.every((role) => row.roles.includes(role))
}

function enrolHere(tx: Db, event: Event, id: string, personId: string, roles: readonly Role[], now: number): void {
  const { clubId } = event
  const { publicKey, privateKey } = serverKey(tx, clubId)
  const row = { id, clubId, eventId: event.id, kid: SERVER_KID, name: 'The office', publicKey, certificate: '', enrolledAt: now } as const
  tx.insert(device)
    .values({ ...row, state: 'active' })
    .onConflictDoNothing()
    .run()
  tx.insert(devicePerson)
    .values({ clubId, deviceId: id, personId, roles })
    .onConflictDoUpdate({ target: [devicePerson.deviceId, devicePerson.personId], set: { roles } })
    .run()
  const says: DeviceCertificate = {
    v: 1,
    device: id,
    event: event.id,
    kid: SERVER_KID,
    publicKey,
    deviceName: row.name,
    people: peopleOf(tx, id),
    issuedAt: now,
  }
  tx.update(device)
    .set({ certificate: signJws(says, CERTIFICATE_TYPE, privateKey) })
    .where(eq(device.id, id))
    .run()
  tx.update(eventTable)
    .set({ snapshotVersion: sql`${eventTable.snapshotVersion} + 1` })
    .where(eq(eventTable.id, event.id))
    .run()
}

function peopleOf(tx: Db, id: string): DeviceCertificate['people'] {
  return tx
    .select({ id: person.id, name: person.name, roles: devicePerson.roles })
    .from(devicePerson)
    .innerJoin(person, eq(person.id, devicePerson.personId))
    .where(eq(devicePerson.deviceId, id))
    .orderBy(person.id)
    .all()
    .map((row) => ({ ...row, roles: row.roles as Role[] }))
}
