import type { Book, BookCheck } from './book'
import type { CarFacts } from './car-facts'
import type { Depth, JudgedKind } from './checklist'
import { DEPTHS } from './checklist'
import { evaluateCondition } from './condition'

/** Whether the pinned facts say that a check is not for this subject. A fact that is not known never says so. */
export function doesNotApply(check: Pick<BookCheck, 'applies'>, facts: CarFacts): boolean {
  return check.applies !== undefined && evaluateCondition(check.applies, facts) === false
}

/** Every check of the book that applies to a subject of that kind with these facts, at any depth, in checklist order. */
export function applicableChecks(book: Book, subject: JudgedKind, facts: CarFacts): BookCheck[] {
  return book.checks.filter((check) => check.subject === subject && !doesNotApply(check, facts))
}

/** The applicable checks that a walk of that depth asks: its own and those of every shallower depth. */
export function askedChecks(book: Book, subject: JudgedKind, facts: CarFacts, depth: Depth): BookCheck[] {
  return applicableChecks(book, subject, facts).filter((check) => DEPTHS.indexOf(check.depth) <= DEPTHS.indexOf(depth))
}
