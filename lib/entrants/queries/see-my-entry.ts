import 'server-only'
import { and, asc, eq, gt } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { callUp, timetableBlock } from '@/db/schema'
import type { Book } from '@/lib/checklist/book'
import type { MyEntry, myEntry } from '@/lib/contracts/my-entry'
import type { SubjectState } from '@/lib/inspection/state'
import { subjectKey } from '@/lib/inspection/subject'
import { wireSentence, wireStations } from '@/lib/inspection/wire'
import { entryCodeText } from '@/lib/pass/entry-code'
import type { AccountActor } from '@/lib/platform/actor'
import type { Command } from '@/lib/platform/command'
import { refuse } from '@/lib/platform/refusal'
import { civilDate } from '@/lib/rules/civil-date'
import { declaredItems, sumOf } from '../declared-items'
import { mendDeclared, mendSeen } from '../mend-of'
import type { DayReading, ReadDay } from '../read-day'
import { draftOf, signedOf } from './declarations-of'
import { isMyDrive, type MyEntryPerson, myEntryRow, type MyEntryRow } from './my-entry-row'

/** One's own entry, by the reading of its log that is handed in. */
export function seeMyEntry(readDay: ReadDay): Command<typeof myEntry> {
  return ({ params }, actor, { database, now }) => readMyEntry(readDay, database, actor, params.entry, now) ?? refuse('missing')
}

/** As `seeMyEntry`, for a page; null where it is not one's own. */
export function readMyEntry(readDay: ReadDay, database: Db, actor: AccountActor, entryId: string, now: number): MyEntry | null {
  const row = myEntryRow(database, actor, entryId)
  const reading = row === null ? null : readDay(database, row.event.id, now)
  if (row === null || reading === null) return null
  const { entry, event, car } = row
  const state = reading.stateOf(subjectKey({ car: entry.id }))
  const when = reading.day < event.firstDay ? 'before' : reading.day > event.lastDay ? 'over' : 'on'
  const recorded = reading.entryNow(entry.id)
  return {
    at: now,
    id: entry.id,
    codeText: entryCodeText({ event: event.code, entry: entry.code }),
    number: recorded?.number ?? entry.number,
    plate: entry.plate,
    model: car.model,
    colour: car.colour,
    group: row.group.name,
    withdrawn: entry.withdrawn || state.withdrawn,
    event: { name: event.name, venue: event.venue, firstDay: event.firstDay, lastDay: event.lastDay, timeZone: event.timeZone },
    day: reading.day,
    when,
    nextSessionAt: nextSession(database, row, now),
    callUp: toldWindow(database, row.entry.id, now),
    people: row.people.map((person) => aboard(person, reading)),
    mayDeclare: isMyDrive(row) && when !== 'over' && !entry.withdrawn && !state.withdrawn,
    ...declaredAndSeen(database, actor, row, reading, state),
  }
}

type Stands = Pick<MyEntry, 'declaration' | 'preCheck' | 'verdict' | 'isPresented' | 'hasLivePass' | 'held' | 'bolts' | 'sentence' | 'mend'>

function declaredAndSeen(database: Db, actor: AccountActor, row: MyEntryRow, reading: DayReading, state: SubjectState): Stands {
  const { entry, event } = row
  const [signed, draft] = [signedOf(database, entry.id), draftOf(database, entry.id, actor.accountId)]
  const inForce = reading.bookOf(event.checklistHash, event.limitsHash)
  const pinned = state.presentedHeads.at(-1)?.record
  const book = (pinned && reading.bookOf(pinned.checklist, pinned.limits)) ?? inForce
  // Of those who share the car everybody sees the verdict, and only their own kit.
  const people = row.people.filter(({ role, isMe }) => role === 'driver' && isMe).map(({ id }) => id)
  const parts = signed?.parts ?? { facts: {}, answers: {} }
  const items = inForce ? declaredItems(inForce.checks, parts, people, civilDate(event.lastDay)) : []
  const bolts = book ? wireStations(state, book) : []
  const isLookedAt = state.checks.size > 0 && [...state.checks.values()].some(({ heads }) => heads.length > 0)
  return {
    declaration: {
      state: signed ? 'signed' : draft ? 'draft' : 'none',
      version: signed?.version ?? null,
      signedAt: signed?.signedAt ?? null,
      signedBy: signed?.signedBy ?? null,
      draftAt: draft?.at ?? null,
    },
    preCheck: sumOf(items),
    verdict: entry.withdrawn ? 'withdrawn' : state.verdict,
    isPresented: state.presentedHeads.length > 0,
    hasLivePass: state.passes.some((pass) => pass.state === 'live'),
    held: heldWords(state, book),
    bolts: bolts.map(({ short, state: bolt }) => ({ label: short, state: bolt })),
    sentence: wireSentence(bolts),
    mend: [
      ...(book && isLookedAt ? mendSeen(state, book, null) : inForce && signed ? mendDeclared(items, inForce, nameIn(row)) : []),
      ...mendOfPeople(row, reading, book),
    ],
  }
}

function mendOfPeople({ people }: MyEntryRow, reading: DayReading, book: Book | null): MyEntry['mend'] {
  if (book === null) return []
  return people.filter(({ isMe }) => isMe).flatMap(({ id, name }) => [...mendSeen(reading.stateOf(subjectKey({ person: id })), book, name)])
}

function nameIn({ people }: MyEntryRow): (person: string) => string {
  return (person) => people.find(({ id }) => id === person)?.name ?? ''
}

function aboard({ id, name, role, isMe }: MyEntryPerson, reading: DayReading): MyEntry['people'][number] {
  const state = reading.stateOf(subjectKey({ person: id }))
  const band = state.passes.findLast((pass) => pass.state === 'live')?.record
  return { id, name, role, isMe, verdict: state.verdict, band: band?.kind === 'band' ? band.bandNumber : null }
}

function heldWords({ blocks }: SubjectState, book: Book | null): string[] {
  return blocks.map(({ kind, reason }) => {
    if (kind === 'recall') return 'To be shown again before the next session.'
    if (kind === 'wet') return 'The track is wet: what the wet asks for has to be seen.'
    return `${book?.checklist.holdReasons.find(({ id }) => id === reason)?.text ?? 'The crew says why'}.`
  })
}

/** The start of the group's next session; before a timetable is there, of its first. */
function nextSession(database: Db, { event, group }: MyEntryRow, now: number): number | null {
  const block = database
    .select({ startsAt: timetableBlock.startsAt })
    .from(timetableBlock)
    .where(
      and(
        eq(timetableBlock.eventId, event.id),
        eq(timetableBlock.groupId, group.id),
        eq(timetableBlock.kind, 'session'),
        gt(timetableBlock.startsAt, now),
      ),
    )
    .orderBy(asc(timetableBlock.startsAt))
    .limit(1)
    .get()
  if (block) return block.startsAt
  return group.firstSessionAt !== null && group.firstSessionAt > now ? group.firstSessionAt : null
}

/** The window the entry was told, the next that is not over; null where none was told. */
function toldWindow(database: Db, entryId: string, now: number): MyEntry['callUp'] {
  const told = database
    .select({ from: callUp.startsAt, to: callUp.endsAt })
    .from(callUp)
    .where(and(eq(callUp.entryId, entryId), gt(callUp.endsAt, now)))
    .orderBy(asc(callUp.startsAt))
    .limit(1)
    .get()
  return told ?? null
}
