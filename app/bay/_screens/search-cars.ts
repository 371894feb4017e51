import type { Verdict } from '@/lib/inspection/state'
import type { PassList } from '@/lib/pass/pass-list'
import { parseTypedCode } from '@/lib/pass/typed-code'
import type { DayEntry } from '@/lib/sync/client/day-client'

/** Cars that answer to what was typed, best first: the very number or code, the very plate, a number that begins so, a plate that holds it. */
export function searchCars(entries: readonly DayEntry[], query: string, byCode: string | null): readonly DayEntry[] {
  const wanted = fold(query)
  if (wanted === '') return []
  const rank = (entry: DayEntry) => {
    if (entry.id === byCode || fold(entry.number) === wanted) return 0
    if (fold(entry.plate) === wanted) return 1
    if (fold(entry.number).startsWith(wanted)) return 2
    return fold(entry.plate).includes(wanted) ? 3 : null
  }
  return entries
    .flatMap((entry) => {
      const place = rank(entry)
      return place === null ? [] : [{ entry, place }]
    })
    .sort((a, b) => a.place - b.place || a.entry.number.localeCompare(b.entry.number, 'en', { numeric: true }))
    .map(({ entry }) => entry)
}

/** The entry whose pass has this typed code; null where the text is no code or no pass has it. */
export function entryOfCode(list: PassList | null, query: string): string | null {
  const code = parseTypedCode(query)
  if (code === null) return null
  return list?.entries.find((entry) => entry.passes.some((pass) => pass.typedCode === code))?.entry ?? null
}

/** Whether somebody has begun with it and it still needs somebody. */
export function isUnfinished(verdict: Verdict): boolean {
  return verdict === 'in progress' || verdict === 'not passed' || verdict === 'held'
}

/** Letters and digits only: nobody types the gap in a plate. */
function fold(text: string): string {
  return text.toUpperCase().replace(/[^\p{L}\p{N}]/gu, '')
}
