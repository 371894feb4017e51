import { crewName } from '@/app/_crew/crew-name'
import { clockTime, dayWords } from '@/app/_crew/say-when'
import { holdRow } from '@/lib/checklist/resolve-hold'
import type { Against } from '@/lib/inspection/stands-against'
import { isKnown } from '@/lib/inspection/record'
import { alsoLookFor, blockWords } from '@/lib/pass/build-pass-list'
import { triggerWords } from '@/lib/pass/trigger-words'
import type { DayClient } from '@/lib/sync/client/day-client'
import type { Walk } from './use-walk'

/** One line of what stands against a subject, in words. */
export interface AgainstWords {
  readonly what: string
  /** Since when and by whom. */
  readonly since: string
  /** Titles of what is to be seen again; empty where only the chief ends it. */
  readonly seeAgain: readonly string[]
  readonly alsoLook: readonly string[]
  readonly warning: string | null
}

export function againstWords(day: DayClient, { record, kind, at, actor, block }: Against, { book, state }: Walk): AgainstWords {
  const snapshot = day.snapshot()
  const zone = snapshot?.event.timeZone ?? 'UTC'
  const isToday = record.day === day.status().day
  const since = `since ${isToday ? '' : `${dayWords(record.day)}, `}${clockTime(at, zone)}, by ${crewName(day, actor)}`
  const known = isKnown(record) ? record : null
  const titles = (ids: readonly string[]) => ids.map((id) => book?.stations.get(id)?.title ?? id)
  const checks = (ids: readonly string[]) => ids.map((id) => book?.byId.get(id)?.short ?? id)
  if (known?.kind === 'recall') {
    const when = snapshot === null ? '' : triggerWords(known.trigger, snapshot)
    const seeAgain = [...new Set([...titles(known.stations), ...checks(known.checks)])]
    return { what: `Recall: to be shown ${when}`, since, seeAgain, alsoLook: [], warning: null }
  }
  const reason = known?.kind === 'hold' ? known.reason : (block?.reason ?? 'wet-declared')
  const stations = new Set([...(block?.stations ?? []), ...(block?.checksLeft ?? []).flatMap((id) => book?.byId.get(id)?.station ?? [])])
  return {
    what: blockWords({ kind, reason }, book),
    since,
    seeAgain: block?.onlyChiefLifts ? [] : titles([...stations]),
    alsoLook: alsoLookFor({ kind, reason }, state, book),
    warning: kind === 'hold' ? (holdRow(reason, book)?.warning ?? null) : null,
  }
}
