import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, crewMember, person } from '@/db/schema'
import type { Role } from '@/lib/permissions/policy'

/** The roles a person of an event holds at this moment: accepted crew roles, and those of their account in the club. */
export function personRoles(database: Db, personId: string): readonly Role[] {
  const crew = database
    .select({ role: crewMember.role })
    .from(crewMember)
    .where(and(eq(crewMember.personId, personId), eq(crewMember.state, 'accepted')))
    .all()
  const owner = database
    .select({ roles: account.roles })
    .from(person)
    .innerJoin(account, eq(account.id, person.accountId))
    .where(eq(person.id, personId))
    .get()
  return [...new Set<Role>([...crew.map(({ role }) => role), ...(owner?.roles ?? [])])]
}
