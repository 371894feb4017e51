import 'server-only'
import { and, asc, desc, eq, inArray } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, crewMember, declaration, device, entry, entryPerson, type event, person, runGroup, timetableBlock } from '@/db/schema'
import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import { partsOf } from '@/lib/contracts/declaration'
import { plateTail } from '@/lib/pass/plate-tail'
import { sha256 } from '@/lib/platform/sha256'
import type { EventFrame } from './event-frame'
import type { EventLog } from './event-log'
import { checklistBody, limitsBody } from './pinned-books'

interface Made {
  readonly tag: string
  readonly snapshot: DaySnapshot
}

const holder = globalThis as typeof globalThis & { lockwireSnapshots?: WeakMap<object, Map<string, Made>> }

/** What devices carry of an event besides its log; no address, telephone or birth date. Made once per version of what it is made of. */
export function daySnapshotOf(database: Db, frame: EventFrame, log: EventLog, publicOrigin: string): DaySnapshot {
  holder.lockwireSnapshots ??= new WeakMap()
  const snapshots = holder.lockwireSnapshots.get(database.$client) ?? new Map<string, Made>()
  holder.lockwireSnapshots.set(database.$client, snapshots)
  const pinned = pinnedHashes(frame, log)
  const tag = JSON.stringify([frame.event.snapshotVersion, publicOrigin, [...pinned.checklists], [...pinned.limits]])
  const known = snapshots.get(frame.event.id)
  if (known?.tag === tag) return known.snapshot
  const body = { ...readRows(database, frame.event, publicOrigin), ...readTexts(database, pinned) }
  // By content, not by counter: a restored server counts to the same number over other rows.
  const snapshot = { version: sha256(JSON.stringify(body)), ...body }
  snapshots.set(frame.event.id, { tag, snapshot })
  return snapshot
}

interface Pinned {
  readonly checklists: ReadonlySet<string>
  readonly limits: ReadonlySet<string>
}

function pinnedHashes({ event: row }: EventFrame, log: EventLog): Pinned {
  const checklists = new Set([row.checklistHash])
  const limits = new Set([row.limitsHash])
  for (const { record } of [...log.presented.values()].flat()) {
    checklists.add(record.checklist)
    limits.add(record.limits)
  }
  return { checklists, limits }
}

function readTexts(database: Db, { checklists, limits }: Pinned): Pick<DaySnapshot, 'checklists' | 'limits'> {
  const texts = (hashes: ReadonlySet<string>, read: (database: Db, hash: string) => unknown) =>
    Object.fromEntries([...hashes].map((hash) => [hash, read(database, hash)] as const).filter(([, body]) => body !== null))
  return { checklists: texts(checklists, checklistBody), limits: texts(limits, limitsBody) }
}

function readRows(
  database: Db,
  row: typeof event.$inferSelect,
  publicOrigin: string,
): Omit<DaySnapshot, 'version' | 'checklists' | 'limits'> {
  const { id, code, name, venue, timeZone, firstDay, lastDay, checklistHash, limitsHash, listStaleMinutes, defaultDepth, kindOfDay } = row
  const people = database
    .select({ id: person.id, name: person.name, minor: person.minor })
    .from(person)
    .where(eq(person.eventId, id))
    .orderBy(asc(person.name))
    .all()
  return {
    event: {
      id,
      code,
      name,
      venue,
      timeZone,
      firstDay,
      lastDay,
      checklistHash,
      limitsHash,
      listStaleMinutes,
      defaultDepth,
      kindOfDay,
      publicOrigin,
    },
    groups: database
      .select({ id: runGroup.id, name: runGroup.name, order: runGroup.order, firstSessionAt: runGroup.firstSessionAt })
      .from(runGroup)
      .where(eq(runGroup.eventId, id))
      .orderBy(asc(runGroup.order))
      .all(),
    timetable: readTimetable(database, id),
    entries: readEntries(database, id),
    people,
    certificates: database
      .select({ certificate: device.certificate })
      .from(device)
      .where(eq(device.eventId, id))
      .all()
      .map((each) => each.certificate),
    crew: readCrew(database, id, new Map(people.map((each) => [each.id, each.name]))),
  }
}

function readEntries(database: Db, eventId: string): DaySnapshot['entries'] {
  const rows = database
    .select({ entry, car })
    .from(entry)
    .innerJoin(car, eq(car.id, entry.carId))
    .innerJoin(runGroup, eq(runGroup.id, entry.groupId))
    .where(eq(entry.eventId, eventId))
    .orderBy(asc(runGroup.order), asc(entry.code))
    .all()
  const own = database.select({ id: entry.id }).from(entry).where(eq(entry.eventId, eventId))
  const aboard = groupBy(database.select().from(entryPerson).where(inArray(entryPerson.entryId, own)).all())
  const declared = groupBy(
    database.select().from(declaration).where(inArray(declaration.entryId, own)).orderBy(desc(declaration.version)).all(),
  )
  return rows.map((each) => {
    const signed = declared.get(each.entry.id)?.find(({ signedAt }) => signedAt !== null)
    const parts = partsOf(signed?.body)
    return {
      id: each.entry.id,
      code: each.entry.code,
      number: each.entry.number,
      plate: each.entry.plate,
      plateTail: plateTail(each.entry.plate),
      colour: each.car.colour,
      model: each.car.model,
      group: each.entry.groupId,
      // What the organiser knows stands; what they do not know the declaration says.
      facts: { ...parts.facts, ...knownOf(each.entry.facts) },
      declaration: signed === undefined ? null : { id: signed.id, version: signed.version },
      declaredAt: signed?.signedAt ?? null,
      declared: parts.answers,
      declaredPhotos: parts.photos,
      history: [],
      people: (aboard.get(each.entry.id) ?? []).map(({ personId, role }) => ({ person: personId, role })),
      withdrawn: each.entry.withdrawn,
      note: each.entry.note,
    }
  })
}

function knownOf(facts: Readonly<Record<string, string | number | boolean | null>>): Readonly<Record<string, string | number | boolean>> {
  return Object.fromEntries(Object.entries(facts).flatMap(([name, value]) => (value === null ? [] : [[name, value] as const])))
}

function readTimetable(database: Db, eventId: string): DaySnapshot['timetable'] {
  return database
    .select()
    .from(timetableBlock)
    .where(eq(timetableBlock.eventId, eventId))
    .orderBy(asc(timetableBlock.startsAt), asc(timetableBlock.id))
    .all()
    .map(({ id, day, kind, groupId, session, startsAt, endsAt, noiseLimitDb }) => ({
      id,
      day,
      kind,
      group: groupId,
      session,
      startsAt,
      endsAt,
      noiseLimitDb,
    }))
}

function readCrew(database: Db, eventId: string, names: ReadonlyMap<string, string>): DaySnapshot['crew'] {
  const rows = database
    .select({ personId: crewMember.personId, role: crewMember.role })
    .from(crewMember)
    .where(and(eq(crewMember.eventId, eventId), eq(crewMember.state, 'accepted')))
    .orderBy(asc(crewMember.askedAt))
    .all()
  const roles = new Map<string, string[]>()
  for (const { personId, role } of rows) roles.set(personId, [...(roles.get(personId) ?? []), role])
  return [...roles].map(([id, held]) => ({ id, name: names.get(id) ?? '', roles: held }))
}

function groupBy<T extends { readonly entryId: string }>(rows: readonly T[]): ReadonlyMap<string, T[]> {
  const groups = new Map<string, T[]>()
  for (const row of rows) {
    const own = groups.get(row.entryId)
    if (own === undefined) groups.set(row.entryId, [row])
    else own.push(row)
  }
  return groups
}
