import 'server-only'
import { and, eq, ne } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { crewMember, device, devicePerson, event } from '@/db/schema'
import { personRoles } from '@/lib/platform/person-roles'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { sha256 } from '@/lib/platform/sha256'
import { type Enrollee, rolesForDevice } from '../enrollee'

/** The accepted joiner of a claim. A claim enrols one key and never another: who has lost the phone joins again. */
export function enrolleeByClaim(tx: Db, eventId: string, claim: string, publicKey: string): Enrollee | Refusal {
  const row = tx
    .select({ member: crewMember, event })
    .from(crewMember)
    .innerJoin(event, eq(event.id, crewMember.eventId))
    .where(and(eq(crewMember.claimHash, sha256(claim)), eq(crewMember.eventId, eventId)))
    .get()
  if (!row) return refuse('claim-unknown')
  if (row.member.state !== 'accepted') return refuse('claim-not-accepted')
  const elsewhere = tx
    .select({ id: device.id })
    .from(devicePerson)
    .innerJoin(device, eq(device.id, devicePerson.deviceId))
    .where(and(eq(devicePerson.personId, row.member.personId), ne(device.publicKey, publicKey)))
    .get()
  if (elsewhere) return refuse('claim-used')
  const roles = rolesForDevice(personRoles(tx, row.member.personId))
  return { event: row.event, personId: row.member.personId, roles, accountId: null }
}
