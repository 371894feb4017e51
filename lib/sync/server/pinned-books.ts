import 'server-only'
import { eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { checklistText, limitsText } from '@/db/schema'
import type { Book } from '@/lib/checklist/book'
import { openCheckedBook } from '@/lib/checklist/open-checked-book'
import { openPinnedBook } from '../core/open-pinned-book'

const books = new Map<string, Book>()

/** The book of a checklist and limits by their hashes; null where the server has no such text. Texts never change, so an opened book holds for ever. */
export function pinnedBook(database: Db, checklistHash: string, limitsHash: string): Book | null {
  const name = `${checklistHash} ${limitsHash}`
  const known = books.get(name)
  if (known !== undefined) return known
  const checklist = checklistBody(database, checklistHash)
  const limits = limitsBody(database, limitsHash)
  if (checklist === null || limits === null) return null
  const texts = { checklists: { [checklistHash]: checklist }, limits: { [limitsHash]: limits } }
  const book = openPinnedBook(texts, checklistHash, limitsHash, openCheckedBook)
  if (book !== null) books.set(name, book)
  return book
}

/** A published checklist's JSON by its hash; null where there is none. */
export function checklistBody(database: Db, hash: string): unknown {
  const row = database.select({ body: checklistText.body }).from(checklistText).where(eq(checklistText.hash, hash)).get()
  return row === undefined ? null : (JSON.parse(row.body) as unknown)
}

/** A published set of limits by its hash; null where there is none. */
export function limitsBody(database: Db, hash: string): unknown {
  const row = database.select({ body: limitsText.body }).from(limitsText).where(eq(limitsText.hash, hash)).get()
  return row === undefined ? null : (JSON.parse(row.body) as unknown)
}
