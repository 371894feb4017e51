import type { Book } from '@/lib/checklist/book'
import { holdRow } from '@/lib/checklist/resolve-hold'
import { isKnown } from '@/lib/inspection/record'
import type { Against } from '@/lib/inspection/stands-against'
import type { SubjectState } from '@/lib/inspection/state'
import { alsoLookFor, blockWords } from './build-pass-list'
import { triggerWords, type TriggerNames } from './trigger-words'

/** A hold, recall, wet switch or unknown stop in words, for lists. */
export interface AgainstWords {
  readonly what: string
  /** Titles of what is to be seen again; empty where only the chief ends it, and once it has ended. */
  readonly seeAgain: readonly string[]
  /** What its reason asks for and the checklist has nothing for. */
  readonly alsoLook: readonly string[]
  readonly warning: string | null
}

export function againstWords(
  against: Pick<Against, 'record' | 'kind' | 'block'>,
  state: SubjectState,
  book: Book | null,
  names: TriggerNames,
): AgainstWords {
  const { record, kind, block } = against
  const known = isKnown(record) ? record : null
  const title = (id: string) => book?.stations.get(id)?.title ?? id
  if (known?.kind === 'recall') {
    const checks = known.checks.map((id) => book?.byId.get(id)?.short ?? id)
    const seeAgain = [...new Set([...known.stations.map(title), ...checks])]
    return { what: `Recall: to be shown ${triggerWords(known.trigger, names)}`, seeAgain, alsoLook: [], warning: null }
  }
  const reason = known?.kind === 'hold' ? known.reason : kind === 'wet' ? 'wet-declared' : record.kind
  const left = block === null || block.onlyChiefLifts ? [] : block.checksLeft
  const stations = block === null || block.onlyChiefLifts ? [] : block.stations
  return {
    what: blockWords({ kind, reason }, book),
    seeAgain: [...new Set([...stations, ...left.flatMap((id) => book?.byId.get(id)?.station ?? [])])].map(title),
    alsoLook: alsoLookFor({ kind, reason }, state, book),
    warning: kind === 'hold' ? (holdRow(reason, book)?.warning ?? null) : null,
  }
}
