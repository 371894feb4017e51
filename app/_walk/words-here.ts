import { crewName } from '@/app/_crew/crew-name'
import { clockTime, dayWords } from '@/app/_crew/say-when'
import type { Against } from '@/lib/inspection/stands-against'
import { againstWords, type AgainstWords } from '@/lib/pass/against-words'
import type { DayClient } from '@/lib/sync/client/day-client'
import type { Walk } from './use-walk'

/** One line of what stands against a subject, in words, with since when and by whom. */
export function wordsHere(day: DayClient, against: Against, { book, state }: Walk): AgainstWords & { readonly since: string } {
  const snapshot = day.snapshot()
  const zone = snapshot?.event.timeZone ?? 'UTC'
  const { record, at, actor } = against
  const isToday = record.day === day.status().day
  const since = `${against.state === 'waiting' ? 'said' : 'since'} ${isToday ? '' : `${dayWords(record.day)}, `}${clockTime(at, zone)}, by ${crewName(day, actor)}`
  return { ...againstWords(against, state, book, snapshot ?? { groups: [], event: { timeZone: zone } }), since }
}
