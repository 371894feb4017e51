import type { Book } from '@/lib/checklist/book'
import type { HoldReason } from '@/lib/checklist/checklist'
import type { DraftOf } from '@/lib/sync/client/draft'

/** What may always be said: something no reason of the list fits. Naming nothing to see again, it is ended by the chief alone (rule F5). */
export const SOMETHING_ELSE: HoldReason = { id: 'something-else', text: 'Something else', subject: 'car', stations: [], checks: [] }

/** A hold with the stations and checks its reason names; a check asked per corner is written out for each of its corners. */
export function holdDraft(
  subject: { readonly car: string } | { readonly person: string },
  reason: HoldReason,
  stickerRemoved: boolean | null,
  book: Book | null,
): DraftOf<'hold'> {
  const checks = reason.checks.flatMap((check) => unfold(check, book))
  return { kind: 'hold', subject, reason: reason.id, stations: [...reason.stations], checks, stickerRemoved }
}

function unfold(check: string, book: Book | null): readonly string[] {
  if (book === null || book.byId.has(check)) return [check]
  const corners = book.checks.filter(({ id, place }) => id === `${check}.${place}`).map(({ id }) => id)
  // A name the book does not know stays as it is: then only the chief ends the hold, which is the stricter side.
  return corners.length > 0 ? corners : [check]
}
