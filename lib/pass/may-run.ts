import { addDays, parseCivilDate } from '@/lib/rules/civil-date'
import type { ListedEntry, ListedPass } from './pass-list'

/** A line of the list that stops the car whatever its pass says (rule P4), however old the list. */
export function isBlocked(entry: Pick<ListedEntry, 'blocks' | 'verdict'>): boolean {
  return entry.blocks.length > 0 || ['withdrawn', 'held', 'not passed'].includes(entry.verdict)
}

/** The only two verdicts under which a pass that is on the list lets a car go (rule P4). */
export function hasPassed(entry: Pick<ListedEntry, 'verdict'>): boolean {
  return entry.verdict === 'passed' || entry.verdict === 'passed with advisories'
}

/** Whether a pass is for that venue day; a day that is no date is never one. */
export function isValidOn({ validFrom, days }: Pick<ListedPass, 'validFrom' | 'days'>, day: string): boolean {
  const first = parseCivilDate(validFrom)
  return first !== null && parseCivilDate(day) !== null && first <= day && day < addDays(first, days)
}

/** The live passes of an entry for that day. */
export function livePasses(entry: Pick<ListedEntry, 'passes'>, day: string): readonly ListedPass[] {
  return entry.passes.filter((pass) => pass.state === 'live' && isValidOn(pass, day))
}
