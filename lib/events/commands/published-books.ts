import 'server-only'
import { readdirSync, readFileSync } from 'node:fs'
import { resolve } from 'node:path'
import type { Db } from '@/db/client'
import { checklistText, limitsText } from '@/db/schema'
import { openCheckedBook } from '@/lib/checklist/open-checked-book'
import { checklistSchema, limitsSchema } from '@/lib/checklist/checklist'
import { sha256 } from '@/lib/platform/sha256'

const FOLDER = resolve(process.cwd(), 'checklists')

/** Keeps a published checklist and limits by their hashes, so that an event may use them. Throws where the two do not fit together. */
export function keepBooks(
  tx: Db,
  checklistFile: string,
  limitsFile: string,
): { readonly checklistHash: string; readonly limitsHash: string } {
  const [checklist, limits] = [readText(checklistFile), readText(limitsFile)]
  const hashes = { checklist: sha256(checklist), limits: sha256(limits) }
  openCheckedBook(checklistSchema.parse(JSON.parse(checklist)), limitsSchema.parse(JSON.parse(limits)), hashes)
  tx.insert(checklistText).values({ hash: hashes.checklist, body: checklist }).onConflictDoNothing().run()
  tx.insert(limitsText).values({ hash: hashes.limits, body: limits }).onConflictDoNothing().run()
  return { checklistHash: hashes.checklist, limitsHash: hashes.limits }
}

/** The newest published version of a checklist: `closed-circuit/v2.json`. */
export function newestChecklist(id: string): string {
  const versions = readdirSync(resolve(FOLDER, id)).flatMap((file) => /^v(\d+)\.json$/.exec(file)?.[1] ?? [])
  const newest = Math.max(...versions.map(Number))
  if (!Number.isFinite(newest)) throw new Error(`no version of the checklist ${id} is published`)
  return `${id}/v${String(newest)}.json`
}

function readText(file: string): string {
  return readFileSync(resolve(FOLDER, file), 'utf8')
}
