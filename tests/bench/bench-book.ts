import { readFileSync } from 'node:fs'
import { resolve } from 'node:path'
import type { Book } from '@/lib/checklist/book'
import { openBook } from '@/lib/checklist/open-book'
import { parseChecklist } from '@/lib/checklist/parse-checklist'
import { parseLimits } from '@/lib/checklist/parse-limits'
import { fakeHash } from '../support/paddock-hash'

/** The shipped closed-circuit checklist under the track-day limits. */
export function benchBook(): Book {
  const hashes = { checklist: fakeHash('closed circuit'), limits: fakeHash('track day') }
  return openBook(checklist(), limits(), hashes)
}

function checklist() {
  const read = parseChecklist(json('checklists/closed-circuit/v1.json'))
  if (!read.ok) throw new Error(`the checklist does not read: ${JSON.stringify(read.problems)}`)
  return read.checklist
}

function limits() {
  const read = parseLimits(json('checklists/limits/track-day.json'))
  if (!read.ok) throw new Error(`the limits do not read: ${JSON.stringify(read.problems)}`)
  return read.limits
}

function json(file: string): unknown {
  return JSON.parse(readFileSync(resolve(import.meta.dirname, '../..', file), 'utf8'))
}
