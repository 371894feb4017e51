import { askedChecks } from '@/lib/checklist/applicable-checks'
import type { Book } from '@/lib/checklist/book'
import type { CheckState, Standing } from '@/lib/inspection/state'
import { planWalk, type WalkPlace } from '@/lib/walk/walk-plan'
import { paddockBook } from '../support/paddock-book'

/** How one check stands; a test says only what matters to it. */
export function aState(check: string, standing: Standing, more: Partial<CheckState> = {}): CheckState {
  return {
    check,
    standing,
    heads: [],
    disagreement: false,
    required: true,
    unanswered: [],
    toAnswer: [],
    dispensation: null,
    ...more,
  }
}

/** The walk of a road car of the test list (no cage, no slicks), with what has been said of it. */
export function aWalk(states: readonly CheckState[] = []): readonly WalkPlace[] {
  const book = paddockBook() as Book
  const asked = new Set(askedChecks(book, 'car', { cage: false, slicks: false }, 'standard').map(({ id }) => id))
  return planWalk(book.checklist.places, book.checks, asked, new Map(states.map((state) => [state.check, state])))
}

/** A place of it as a list of what is asked: one by one first, then in brackets what the closing sentence names. */
export function asked(plan: readonly WalkPlace[], place: string): readonly string[] {
  const here = plan.find((one) => one.place.id === place)
  if (!here) return []
  return [...here.oneByOne.map(({ check }) => check.id), ...here.together.map(({ check }) => `(${check.id})`)]
}
