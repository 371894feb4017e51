import 'server-only'
import { mendSeen } from '@/lib/entrants/mend-of'
import { preChecksOf } from '@/lib/entrants/queries/pre-checks-of'
import type { MailReaders, ReadResults } from '@/lib/mail/mail-readers'
import { civilDate, dayNumber } from '@/lib/rules/civil-date'
import { dayReading } from '@/lib/sync/server/day-reading'

const readResults: ReadResults = (database, own, now, entries) => {
  const reading = dayReading(database, own.id, Math.min(now, noonOf(own.lastDay)))
  const book = reading?.bookOf(own.checklistHash, own.limitsHash)
  if (!reading || !book) return []
  return entries.map((entry) => {
    const state = reading.stateOf(`car:${entry}`)
    const open = mendSeen(state, book, null).map(({ place, prompt, words }) => `${place}: ${prompt}: ${words}`)
    return { entry, verdict: state.verdict, open }
  })
}

/** What mail tells of: the pre-check of what was declared, and how the cars stood. */
export const mailReaders: MailReaders = {
  preChecks: (database, own, now) => {
    const book = dayReading(database, own.id, now)?.bookOf(own.checklistHash, own.limitsHash)
    return book ? preChecksOf(database, own, book) : []
  },
  results: readResults,
}

/** An ok lapses at midnight; asked the week after, a result is still that of the last day. */
function noonOf(day: string): number {
  return dayNumber(civilDate(day)) * 86_400_000 + 43_200_000
}
