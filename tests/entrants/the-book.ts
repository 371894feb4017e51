import { readFileSync } from 'node:fs'
import { checklistSchema, limitsSchema } from '@/lib/checklist/checklist'
import { askedAtHome } from '@/lib/checklist/declarable'
import { openBook } from '@/lib/checklist/open-book'
import { civilDate } from '@/lib/rules/civil-date'

// By path: under jsdom a module has no file of its own.
const checklistJson = (file: string): unknown => JSON.parse(readFileSync(`checklists/${file}`, 'utf8'))

/** The shipped checklist that the demo's event uses, opened. */
export const BOOK = openBook(
  checklistSchema.parse(checklistJson('closed-circuit/v1.json')),
  limitsSchema.parse(checklistJson('limits/track-day.json')),
  { checklist: 'c', limits: 'l' },
)
export const CHECKS = BOOK.checks.filter((check) => check.subject !== 'fit' && askedAtHome(check) !== null)
export const FACTS = BOOK.checklist.facts.filter(({ subject }) => subject === 'car')
export const SUNDAY = civilDate('2026-05-10')
export const IDA = '019a2303-0192-7bb3-8a50-6041506fb36e'
