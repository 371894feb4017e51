import type { Book } from '@/lib/checklist/book'
import { checklistSchema, limitsSchema } from '@/lib/checklist/checklist'
import { openBook } from '@/lib/checklist/open-book'

/** Texts of checklists and limits by their hash, as the snapshot carries them. */
export interface PinnedTexts {
  readonly checklists: Readonly<Record<string, unknown>>
  readonly limits: Readonly<Record<string, unknown>>
}

/** Opens the book that a `presented` pins; null where a text is not at hand or is none, which leaves everything not seen. The server opens with `openCheckedBook`. */
export function openPinnedBook(texts: PinnedTexts, checklistHash: string, limitsHash: string, open = openBook): Book | null {
  const checklist = checklistSchema.safeParse(texts.checklists[checklistHash])
  const limits = limitsSchema.safeParse(texts.limits[limitsHash])
  if (!checklist.success || !limits.success) return null
  return open(checklist.data, limits.data, { checklist: checklistHash, limits: limitsHash })
}
