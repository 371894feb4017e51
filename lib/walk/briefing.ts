import type { Book, BookCheck } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { Depth } from '@/lib/checklist/checklist'
import type { RecordOf } from '@/lib/inspection/record'
import type { SubjectState } from '@/lib/inspection/state'
import type { CivilDate } from '@/lib/rules/civil-date'
import { answerCheck, isRefusal, type FindingDraft } from '@/lib/walk/answer'

/** A checklist's check of the briefing: a person's, its id ending in `.briefing`. Null in a checklist that asks for none. */
export function briefingCheck(book: Book): BookCheck | null {
  return book.checks.find(({ id, subject }) => subject === 'person' && id.endsWith('.briefing')) ?? null
}

export interface AtBriefing {
  readonly person: string
  readonly minor: boolean
  readonly state: SubjectState
  /** The book this person's records pin; before the first the one in force. */
  readonly book: Book
}

/** Whether one tick may say that they were there: nobody has said otherwise, and it has not been said. */
export function briefingOf({ state, book }: Pick<AtBriefing, 'state' | 'book'>): 'open' | 'was there' | 'look at it' {
  const check = briefingCheck(book)
  const stands = check === null ? undefined : state.checks.get(check.id)
  if (stands?.standing === 'ok') return 'was there'
  return stands === undefined || stands.standing === 'not-seen' ? 'open' : 'look at it'
}

interface BriefingSaid {
  readonly pins: { readonly checklist: string; readonly limits: string; readonly depth: Depth }
  readonly on: CivilDate
  /** Reference of the note that says which briefing it was. */
  readonly note: string
}

export type BriefingDraft =
  FindingDraft | Pick<RecordOf<'presented'>, 'kind' | 'subject' | 'checklist' | 'limits' | 'declaration' | 'facts' | 'depth'>

/**
 * What one action records of everybody who was at a briefing: for each the finding, and before it who they are where nobody had begun with them, with what is
 * known and nothing guessed. Whoever has it already, or of whom something else was said, is left out.
 */
export function briefingDrafts(people: readonly AtBriefing[], { pins, on, note }: BriefingSaid): readonly BriefingDraft[] {
  return people.flatMap((one): readonly BriefingDraft[] => {
    const check = briefingCheck(one.book)
    if (check === null || briefingOf(one) !== 'open') return []
    const subject = { person: one.person }
    const facts = one.state.presentedHeads[0]?.record.facts ?? knownFacts(one)
    const seen = answerCheck(subject, check, { say: 'ok', values: {} }, facts, on, note)
    if (isRefusal(seen)) return []
    if (one.state.presentedHeads.length > 0) return [seen]
    return [{ kind: 'presented', subject, declaration: null, facts: { ...facts }, ...pins }, seen]
  })
}

/** What the rows know of a person, as far as the checklist asks for it. */
export function knownFacts({ minor, book }: Pick<AtBriefing, 'minor' | 'book'>): CarFacts {
  return book.checklist.facts.some(({ name, subject }) => subject === 'person' && name === 'minor') ? { minor } : {}
}
