import 'server-only'
import { eq, max } from 'drizzle-orm'
import { event, runGroup } from '@/db/schema'
import { transaction } from '@/db/transaction'
import { type createEvent as contract, LONGEST_EVENT_DAYS } from '@/lib/contracts/events'
import type { Command } from '@/lib/platform/command'
import { newId } from '@/lib/platform/ids'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { writeAudit } from '@/lib/platform/write-audit'
import { dayNumber, parseCivilDate } from '@/lib/rules/civil-date'
import type { EventBody } from '@/lib/contracts/events'
import { keepBooks, newestChecklist } from './published-books'

/** Makes an event of one's own club; its number in pass tokens is the next that the club has never used. */
export const createEvent: Command<typeof contract> = ({ body }, actor, { database, now }) => {
  const refused = refusedBody(body)
  if (refused) return refused
  const id = newId()
  transaction(database, (tx) => {
    const latest = tx
      .select({ code: max(event.code) })
      .from(event)
      .where(eq(event.clubId, actor.clubId))
      .get()
    const { groups, ...said } = body
    tx.insert(event)
      .values({
        ...said,
        ...keepBooks(tx, newestChecklist('closed-circuit'), 'limits/track-day.json'),
        id,
        clubId: actor.clubId,
        code: (latest?.code ?? 0) + 1,
        nextKid: 1,
        nextEntryCode: 1,
        snapshotVersion: 1,
        createdAt: now,
      })
      .run()
    groups.forEach((name, index) => {
      tx.insert(runGroup)
        .values({ id: newId(), clubId: actor.clubId, eventId: id, name, order: index + 1, firstSessionAt: null })
        .run()
    })
    writeAudit(tx, {
      clubId: actor.clubId,
      eventId: id,
      at: now,
      accountId: actor.accountId,
      action: 'event-created',
      detail: { groups: groups.length },
    })
  })
  return { event: id }
}

function refusedBody({ firstDay, lastDay, groups }: EventBody): Refusal | null {
  const fault = (path: string, message: string) => refuse('invalid', { issues: [{ path, message }] })
  const [first, last] = [parseCivilDate(firstDay), parseCivilDate(lastDay)]
  if (first === null) return fault('firstDay', 'There is no such day.')
  if (last === null) return fault('lastDay', 'There is no such day.')
  const days = dayNumber(last) - dayNumber(first) + 1
  if (days < 1) return fault('lastDay', 'It ends before it begins.')
  if (days > LONGEST_EVENT_DAYS) return fault('lastDay', `An event has at most ${LONGEST_EVENT_DAYS} days; make several.`)
  const folded = groups.map((name) => name.toLowerCase())
  return new Set(folded).size === folded.length ? null : fault('groups', 'Two groups have the same name.')
}
