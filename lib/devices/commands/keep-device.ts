import 'server-only'
import { and, eq, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { device, devicePerson, event as eventTable } from '@/db/schema'
import { CERTIFICATE_TYPE, type DeviceCertificate } from '@/lib/contracts/device-certificate'
import type { Role } from '@/lib/permissions/policy'
import { LAST_KID } from '@/lib/platform/adopt-device'
import { newId } from '@/lib/platform/ids'
import { signJws } from '@/lib/platform/jws'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { serverKey } from '@/lib/platform/server-key'
import { writeAudit } from '@/lib/platform/write-audit'
import type { Enrollee } from '../enrollee'
import { peopleOf } from '../queries/people-of'

export interface KeptDevice {
  readonly device: string
  readonly kid: number
  readonly certificate: string
  readonly people: { id: string; name: string; roles: Role[] }[]
}

interface Wanted {
  readonly name: string
  readonly publicKey: string
}

/** Writes the device of this key with its person and a certificate that says what is written; inside the caller's transaction. */
export function keepDevice(tx: Db, enrollee: Enrollee, wanted: Wanted, now: number): KeptDevice | Refusal {
  const { event } = enrollee
  const known = tx
    .select()
    .from(device)
    .where(and(eq(device.eventId, event.id), eq(device.publicKey, wanted.publicKey)))
    .get()
  if (known && known.state !== 'active') return refuse('device-retired')
  const id = known?.id ?? newId()
  const kid = known?.kid ?? event.nextKid
  if (kid > LAST_KID) return refuse('keys-used-up')
  if (known && isCertified(tx, id, enrollee)) return { device: id, kid, certificate: known.certificate, people: peopleOf(tx, id) }
  if (!known) {
    const row = { id, clubId: event.clubId, eventId: event.id, kid, ...wanted, certificate: '', state: 'active', enrolledAt: now } as const
    tx.insert(device).values(row).run()
  }
  tx.insert(devicePerson)
    .values({ clubId: event.clubId, deviceId: id, personId: enrollee.personId, roles: enrollee.roles })
    .onConflictDoUpdate({ target: [devicePerson.deviceId, devicePerson.personId], set: { roles: enrollee.roles } })
    .run()
  const people = peopleOf(tx, id)
  const deviceName = known?.name ?? wanted.name
  const says: DeviceCertificate = { v: 1, device: id, event: event.id, kid, publicKey: wanted.publicKey, deviceName, people, issuedAt: now }
  const certificate = signJws(says, CERTIFICATE_TYPE, serverKey(tx, event.clubId).privateKey)
  tx.update(device).set({ certificate }).where(eq(device.id, id)).run()
  tx.update(eventTable)
    .set({ nextKid: sql`max(${eventTable.nextKid}, ${kid + 1})`, snapshotVersion: sql`${eventTable.snapshotVersion} + 1` })
    .where(eq(eventTable.id, event.id))
    .run()
  const detail = { device: id, kid, person: enrollee.personId, roles: enrollee.roles }
  writeAudit(tx, { clubId: event.clubId, eventId: event.id, at: now, accountId: enrollee.accountId, action: 'device-enrolled', detail })
  return { device: id, kid, certificate, people }
}

function isCertified(tx: Db, deviceId: string, enrollee: Enrollee): boolean {
  const row = tx
    .select({ roles: devicePerson.roles })
    .from(devicePerson)
    .where(and(eq(devicePerson.deviceId, deviceId), eq(devicePerson.personId, enrollee.personId)))
    .get()
  return row !== undefined && row.roles.length === enrollee.roles.length && enrollee.roles.every((role) => row.roles.includes(role))
}
