import type * as z from 'zod/mini'
import type { CheckDefinition, FactDefinition, HoldReason, JudgedKind, Place, Station } from './checklist'
import { checkSchema, factSchema, holdReasonSchema, placeSchema, stationSchema } from './checklist'

/** One entry of a list as it was read: its place in the list, its id if it has one, and itself where its shape is right. */
export interface Read<T> {
  readonly index: number
  readonly id: string | null
  readonly value: T | null
}

/**
 * A checklist read entry by entry, so that one entry of the wrong shape does not hide what is wrong with the others:
 * its id is still known, and nothing that refers to it is blamed.
 */
export interface Draft {
  readonly facts: readonly Read<FactDefinition>[]
  readonly stations: readonly Read<Station>[]
  readonly places: readonly Read<Place>[]
  readonly checks: readonly Read<CheckDefinition>[]
  readonly holdReasons: readonly Read<HoldReason>[]
}

/** Reads whatever of a checklist can be read; never throws. */
export function readDraft(json: unknown): Draft {
  return {
    facts: readList(json, 'facts', 'name', factSchema),
    stations: readList(json, 'stations', 'id', stationSchema),
    places: readList(json, 'places', 'id', placeSchema),
    checks: readList(json, 'checks', 'id', checkSchema),
    holdReasons: readList(json, 'holdReasons', 'id', holdReasonSchema),
  }
}

/** Subjects by id; null where the entry is there but its shape is wrong. */
export function subjectsById(entries: readonly Read<{ readonly subject: JudgedKind }>[]): ReadonlyMap<string, JudgedKind | null> {
  return new Map(entries.flatMap((each) => (each.id === null ? [] : [[each.id, each.value?.subject ?? null] as const])))
}

/** Whether an entry may refer to that subject: unknown where the other entry could not be read, and then nobody is blamed. */
export function isOtherSubject(one: JudgedKind, other: JudgedKind | null): boolean {
  return other !== null && other !== one
}

/** Places of a check as a list. */
export function placesOf(check: CheckDefinition): readonly string[] {
  return typeof check.place === 'string' ? [check.place] : check.place
}

/** Ids under which the walk asks a check: its own, or one per place. */
export function askedIds(check: CheckDefinition): readonly string[] {
  return typeof check.place === 'string' ? [check.id] : check.place.map((place) => `${check.id}.${place}`)
}

function readList<T>(json: unknown, list: string, key: string, schema: z.ZodMiniType<T>): Read<T>[] {
  const entries: unknown = isObject(json) ? json[list] : null
  if (!Array.isArray(entries)) return []
  return entries.map((entry: unknown, index) => {
    const parsed = schema.safeParse(entry)
    const id = isObject(entry) && typeof entry[key] === 'string' ? entry[key] : null
    return { index, id, value: parsed.success ? parsed.data : null }
  })
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null
}
