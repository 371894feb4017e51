import type { HoldRow } from '@/lib/checklist/hold-table'
import { resolveHold, type ResolvedHold } from '@/lib/checklist/resolve-hold'
import { nextWholeSession } from '@/lib/inspection/sessions'
import { subjectKey, subjectKind, type Subject } from '@/lib/inspection/subject'
import { can } from '@/lib/permissions/policy'
import type { DayClient, DayEntry } from '@/lib/sync/client/day-client'
import type { Draft, DraftOf } from '@/lib/sync/client/draft'
import { factsPinned } from './facts-pinned'

export interface HoldAsked {
  readonly entry: DayEntry
  readonly row: HoldRow
  /** Persons it touches, where the line touches people. */
  readonly people: readonly string[]
  readonly stickerRemoved: boolean | null
  /** Device clock, ms: which session is the next. */
  readonly now: number
}

type Held = Exclude<Subject, { event: string }>

/** One hold for each subject that the line touches, and the recall that comes with it where whoever is unlocked may make one: one action. */
export function holdDrafts(day: DayClient, asked: HoldAsked): readonly Draft[] {
  const { entry, row, people, stickerRemoved } = asked
  const car: Held = { car: entry.id }
  const held: readonly Held[] = [
    ...(row.car === null ? [] : [car]),
    ...people.flatMap((person): readonly Held[] => [
      ...(row.person === null ? [] : [{ person }]),
      ...(row.fit === null || namesNothing(resolved(day, asked, { fit: entry.id, person })) ? [] : [{ fit: entry.id, person }]),
    ]),
  ]
  const holds = held.map((subject): DraftOf<'hold'> => {
    const { stations, checks } = resolved(day, asked, subject)
    return { kind: 'hold', subject, reason: row.id, stations, checks, stickerRemoved: 'car' in subject ? stickerRemoved : null }
  })
  return [...holds, ...recallWith(day, asked)]
}

/** What the line comes to for one subject of this entry. */
export function resolved(day: DayClient, { entry, row }: Pick<HoldAsked, 'entry' | 'row'>, subject: Held): ResolvedHold {
  const { book, facts } = factsPinned(day, subjectKey(subject), 'car' in subject ? entry.facts : {})
  const kind = subjectKind(subject)
  return resolveHold(row, kind === 'event' ? 'car' : kind, book, facts)
}

/** The recall of the line, after the next whole session of the car's group. Where the checklist lacks what it names, the hold's own stations are shown. */
export function recallWith(day: DayClient, { entry, row, now }: Pick<HoldAsked, 'entry' | 'row' | 'now'>): readonly DraftOf<'recall'>[] {
  const snapshot = day.snapshot()
  if (row.recallAfterSession === null || snapshot === null || !can(day.status().unlocked?.roles ?? [], 'record:recall')) return []
  const subject = { car: entry.id }
  const own = resolved(day, { entry, row: { ...row, id: `${row.id}-recall`, car: row.recallAfterSession } }, subject)
  const { stations, checks } = namesNothing(own) ? resolved(day, { entry, row }, subject) : own
  const session = nextWholeSession(day.dayLog(), snapshot.timetable, entry.group, now + day.status().clockOffset)
  return [{ kind: 'recall', subject, stations, checks, trigger: { when: 'session-over', group: entry.group, session } }]
}

function namesNothing({ stations, checks }: ResolvedHold): boolean {
  return stations.length + checks.length === 0
}
