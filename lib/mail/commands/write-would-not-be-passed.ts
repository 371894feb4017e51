import 'server-only'
import { eq, gte } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, event } from '@/db/schema'
import { transaction } from '@/db/transaction'
import { enqueueMail } from '@/lib/platform/enqueue-mail'
import { addDays, civilDate } from '@/lib/rules/civil-date'
import { venueDay } from '@/lib/rules/venue-day'
import { wouldNotBePassedListText } from '../mail-texts'
import type { ReadPreChecks } from '../mail-readers'
import { planMailing } from '../plan-mailing'
import { mailingFacts } from '../queries/mailing-facts'
import { writePlanned } from './write-mailing'

type EventRow = typeof event.$inferSelect

/** How long before the first day everybody is told. */
const DAYS_BEFORE = 7

/**
 * From a week before an event until it begins: tells each entrant what would not be passed of what they declared, once a declaration, and the
 * club's organisers once. Safe to call as often as one likes. Gives how many mails were written.
 */
export function writeWouldNotBePassed(database: Db, preChecks: ReadPreChecks, origin: string, now: number): number {
  const ahead = database
    .select()
    .from(event)
    .where(gte(event.firstDay, venueDay(now - 86_400_000, 'UTC')))
    .all()
  return ahead
    .filter((own) => isInWeekBefore(own, now))
    .reduce((written, own) => written + transaction(database, (tx) => writeFor(tx, own, preChecks, origin, now)), 0)
}

function isInWeekBefore({ firstDay, timeZone }: EventRow, now: number): boolean {
  const today = venueDay(now, timeZone)
  return today < firstDay && today >= addDays(civilDate(firstDay), -DAYS_BEFORE)
}

function writeFor(tx: Db, own: EventRow, preChecks: ReadPreChecks, origin: string, now: number): number {
  const facts = mailingFacts(tx, own, { preChecks, results: () => [] }, now)
  const toEntrants = writePlanned(tx, own, planMailing('would-not-be-passed', facts), origin, now)
  const text = wouldNotBePassedListText(own, facts.preChecks, facts.preChecks.length, `${origin}/events/${own.id}/mail`)
  const toOrganisers = organisersOf(tx, own.clubId).filter(({ id, email }) => {
    const sameAs = `would-not-be-passed-list:${own.id}:${id}`
    const where = { clubId: own.clubId, eventId: own.id, entryId: null }
    return enqueueMail(tx, { ...where, ...text, kind: 'would-not-be-passed', to: email, sameAs }, now)
  })
  return toEntrants + toOrganisers.length
}

function organisersOf(tx: Db, clubId: string): readonly (typeof account.$inferSelect)[] {
  return tx
    .select()
    .from(account)
    .where(eq(account.clubId, clubId))
    .all()
    .filter(({ roles }) => roles.includes('organiser'))
}
