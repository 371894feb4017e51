import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { crewMember, device, devicePerson, event, person } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { DeviceCertificate } from '@/lib/contracts/device-certificate'
import { CREW_ROLES, type CrewRole } from '@/lib/permissions/policy'
import { newId } from './ids'
import { writeAudit } from './write-audit'

export const LAST_KID = 255

/**
 * Writes a device back that a restored server has forgotten, with the people its certificate names; false when it cannot be.
 * What the server still knows stands: a role that was ended before the backup stays ended.
 * Where another device was given its kid meanwhile it gets a new one: its records stand by their own signatures, but passes it signed
 * under the old kid are no longer believed, which is the safe way to be wrong.
 */
export function adoptDevice(database: Db, certificate: DeviceCertificate, jws: string, now: number): boolean {
  return transaction(database, (tx) => {
    const home = tx.select().from(event).where(eq(event.id, certificate.event)).get()
    if (!home) return false
    const sameKey = and(eq(device.eventId, home.id), eq(device.publicKey, certificate.publicKey))
    if (tx.select({ id: device.id }).from(device).where(sameKey).get()) return false
    const sameKid = and(eq(device.eventId, home.id), eq(device.kid, certificate.kid))
    const taken = tx.select({ id: device.id }).from(device).where(sameKid).get() !== undefined
    const kid = taken ? home.nextKid : certificate.kid
    if (kid > LAST_KID) return false
    tx.update(event)
      .set({ nextKid: Math.max(home.nextKid, kid + 1), snapshotVersion: home.snapshotVersion + 1 })
      .where(eq(event.id, home.id))
      .run()
    tx.insert(device)
      .values({
        id: certificate.device,
        clubId: home.clubId,
        eventId: home.id,
        kid,
        name: certificate.deviceName,
        publicKey: certificate.publicKey,
        certificate: jws,
        state: 'active',
        enrolledAt: certificate.issuedAt,
      })
      .run()
    for (const member of certificate.people) adoptPerson(tx, home, certificate, member, now)
    const detail = { device: certificate.device, kid, kidWas: certificate.kid }
    writeAudit(tx, { clubId: home.clubId, eventId: home.id, at: now, accountId: null, action: 'device-adopted', detail })
    return true
  })
}

type Home = typeof event.$inferSelect

function adoptPerson(tx: Db, home: Home, certificate: DeviceCertificate, member: DeviceCertificate['people'][number], now: number): void {
  const owner = { clubId: home.clubId, eventId: home.id }
  tx.insert(person)
    .values({ ...owner, id: member.id, name: member.name })
    .onConflictDoNothing()
    .run()
  for (const role of member.roles.filter(isCrewRole)) {
    tx.insert(crewMember)
      .values({ ...owner, id: newId(), personId: member.id, role, state: 'accepted', askedAt: certificate.issuedAt, decidedAt: now })
      .onConflictDoNothing()
      .run()
  }
  tx.insert(devicePerson).values({ clubId: home.clubId, deviceId: certificate.device, personId: member.id, roles: member.roles }).run()
}

function isCrewRole(role: string): role is CrewRole {
  return (CREW_ROLES as readonly string[]).includes(role)
}
