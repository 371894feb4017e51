import type { Book } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { SubjectKey } from '@/lib/inspection/subject'
import type { DayClient } from '@/lib/sync/client/day-client'

/** What a subject was presented with: the book and the facts of each `presented`; before the first the book in force and what the entry says. */
export function factsPinned(
  day: DayClient,
  key: SubjectKey,
  told: CarFacts = {},
): { readonly book: Book | null; readonly facts: readonly CarFacts[] } {
  const heads = day.state(key).presentedHeads.map(({ record }) => record)
  const [first] = heads
  if (first === undefined) return { book: day.book(), facts: [told] }
  return { book: day.book(first.checklist, first.limits), facts: heads.map(({ facts }) => facts) }
}
