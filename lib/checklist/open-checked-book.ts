import type { Book } from './book'
import type { Checklist, Limits } from './checklist'
import { openBook } from './open-book'
import { limitsProblems } from './parse-limits'

/** Opens a book as `openBook` does. Throws when checklist and limits do not fit together: better no book than one whose judging fails at the car. */
export function openCheckedBook(
  checklist: Checklist,
  limits: Limits,
  hashes: { readonly checklist: string; readonly limits: string },
): Book {
  const problems = limitsProblems(checklist, limits)
  if (problems.length > 0)
    throw new Error(`the limits do not fit the checklist: ${problems.map((each) => `${each.path} ${each.problem}`).join('; ')}`)
  return openBook(checklist, limits, hashes)
}
