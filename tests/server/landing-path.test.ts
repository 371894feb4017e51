import { afterEach, beforeEach, expect, test } from 'vitest'
import { eq } from 'drizzle-orm'
import { account } from '@/db/schema'
import { landingPath } from '@/lib/accounts/queries/landing-path'
import { CREW_ROLES } from '@/lib/permissions/policy'
import type { AccountActor } from '@/lib/platform/actor'
import { aClub } from '../support/a-club'
import { freshDatabase } from '../support/fresh-database'

const SATURDAY = Date.UTC(2026, 4, 9, 7)

let fresh: ReturnType<typeof freshDatabase>
beforeEach(() => (fresh = freshDatabase()))
afterEach(() => fresh.close())

function actorOf(accountId: string): AccountActor {
  const row = fresh.database.select().from(account).where(eq(account.id, accountId)).get()
  if (!row) throw new Error('no such account')
  return { kind: 'account', accountId, clubId: row.clubId, name: row.name, clubRoles: row.roles, signInHash: '' }
}

test('who runs the event is led to its board, crew to their post, an entrant to their cars and entries', async () => {
  const club = await aClub(fresh.database)
  const event = club.addEvent()
  const led = (role: Parameters<typeof club.addAccount>[0]) => {
    const id = club.addAccount(role, `${role}@marram.example`)
    if (CREW_ROLES.includes(role as 'chief')) club.addCrew(event, id, role as 'chief')
    return landingPath(fresh.database, actorOf(id), SATURDAY)
  }

  expect(led('organiser')).toBe(`/events/${event}/board`)
  expect(led('admin')).toBe(`/events/${event}/board`)
  expect([led('chief'), led('scrutineer'), led('helper')]).toEqual(['/bay', '/bay', '/bay'])
  expect(led('sign-on')).toBe('/sign-on')
  expect(led('marshal')).toBe('/pit-exit')
  expect(led('entrant')).toBe('/cars')
})

test('an organiser without an event is led to the list of events, and never to another club’s', async () => {
  const other = await aClub(fresh.database, 'Other club')
  other.addEvent()
  const club = await aClub(fresh.database)

  expect(landingPath(fresh.database, actorOf(club.addAccount('organiser', 'o@marram.example')), SATURDAY)).toBe('/events')
})
