import 'server-only'
import { and, eq, max } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, club, crewMember, event, person, runGroup } from '@/db/schema'
import { transaction } from '@/db/transaction'
import { keepBooks } from '@/lib/events/commands/published-books'
import { writeTimetable } from '@/lib/events/commands/save-timetable'
import { newId } from '@/lib/platform/ids'
import { hashPassword } from '@/lib/platform/password'
import { addDays, type CivilDate } from '@/lib/rules/civil-date'
import { venueDay } from '@/lib/rules/venue-day'
import { demoTimetable } from './demo-timetable'
import { demoEmail, MARRAM, MARRAM_ACCOUNTS } from './marram'

export interface SeededMarram {
  readonly clubId: string
  readonly eventId: string
  readonly organiserAccountId: string
  readonly firstDay: CivilDate
  readonly lastDay: CivilDate
}

/** The demo club with its accounts and an event that begins today at the venue. What is there already is left as it is. */
export async function seedMarram(database: Db, now: number): Promise<SeededMarram> {
  const passwordHash = await hashPassword(MARRAM.password)
  const firstDay = venueDay(now, MARRAM.timeZone)
  const lastDay = addDays(firstDay, MARRAM.days - 1)
  return transaction(database, (tx) => {
    const clubId = seedClub(tx)
    const accounts = seedAccounts(tx, clubId, passwordHash, now)
    const eventId = seedEvent(tx, clubId, firstDay, lastDay, now)
    seedCrew(tx, clubId, eventId, accounts, now)
    const organiserAccountId = accounts.get('organiser')
    if (!organiserAccountId) throw new Error('the demo has no organiser')
    return { clubId, eventId, organiserAccountId, firstDay, lastDay }
  })
}

function seedClub(tx: Db): string {
  const known = tx.select().from(club).where(eq(club.name, MARRAM.club)).get()
  if (known) return known.id
  const id = newId()
  tx.insert(club).values({ id, name: MARRAM.club }).run()
  return id
}

function seedAccounts(tx: Db, clubId: string, passwordHash: string, now: number): ReadonlyMap<string, string> {
  const ids = MARRAM_ACCOUNTS.map(({ role, name, clubRoles }) => {
    const email = demoEmail(role)
    const known = tx.select({ id: account.id }).from(account).where(eq(account.email, email)).get()
    if (known) return [role, known.id] as const
    const id = newId()
    tx.insert(account).values({ id, clubId, email, name, passwordHash, roles: clubRoles, createdAt: now }).run()
    return [role, id] as const
  })
  return new Map(ids)
}

function seedEvent(tx: Db, clubId: string, firstDay: CivilDate, lastDay: CivilDate, now: number): string {
  const known = tx
    .select({ id: event.id })
    .from(event)
    .where(and(eq(event.clubId, clubId), eq(event.name, MARRAM.event), eq(event.firstDay, firstDay)))
    .get()
  if (known) return known.id
  const owner = { clubId, eventId: newId() }
  const latest = tx
    .select({ code: max(event.code) })
    .from(event)
    .where(eq(event.clubId, clubId))
    .get()
  tx.insert(event)
    .values({
      id: owner.eventId,
      clubId,
      code: (latest?.code ?? 0) + 1,
      name: MARRAM.event,
      venue: MARRAM.venue,
      timeZone: MARRAM.timeZone,
      firstDay,
      lastDay,
      ...keepBooks(tx, MARRAM.checklist, MARRAM.limits),
      defaultDepth: 'standard',
      depthPolicy: 'all',
      listStaleMinutes: MARRAM.listStaleMinutes,
      nextKid: 1,
      nextEntryCode: 1,
      snapshotVersion: 1,
      createdAt: now,
    })
    .run()
  const groups = MARRAM.groups.map((name, index) => {
    const id = newId()
    tx.insert(runGroup)
      .values({ ...owner, id, name, order: index + 1, firstSessionAt: null })
      .run()
    return id
  })
  const made = tx.select().from(event).where(eq(event.id, owner.eventId)).get()
  if (!made) throw new Error('the demo has no event')
  for (let day = firstDay; day <= lastDay; day = addDays(day, 1)) writeTimetable(tx, made, day, demoTimetable(groups))
  return owner.eventId
}

function seedCrew(tx: Db, clubId: string, eventId: string, accounts: ReadonlyMap<string, string>, now: number): void {
  for (const { role, name, crewRole } of MARRAM_ACCOUNTS) {
    const accountId = accounts.get(role)
    if (crewRole === null || accountId === undefined) continue
    const known = tx
      .select({ id: person.id })
      .from(person)
      .where(and(eq(person.eventId, eventId), eq(person.accountId, accountId)))
      .get()
    if (known) continue
    const personId = newId()
    tx.insert(person).values({ id: personId, clubId, eventId, accountId, name }).run()
    const decidedByAccountId = accounts.get('organiser') ?? null
    tx.insert(crewMember)
      .values({
        id: newId(),
        clubId,
        eventId,
        personId,
        role: crewRole,
        state: 'accepted',
        askedAt: now,
        decidedAt: now,
        decidedByAccountId,
      })
      .run()
  }
}
