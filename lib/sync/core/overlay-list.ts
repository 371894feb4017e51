import type { Verdict } from '@/lib/inspection/state'
import type { ListedBlock, ListedEntry, ListedPass } from '@/lib/pass/pass-list'

/** What this device's own log says of one entry, beside what the server's list says. */
export interface OwnWord {
  readonly verdict: Verdict
  readonly blocks: readonly ListedBlock[]
  /** Passes of this device's log that the list does not know yet. */
  readonly passes: readonly ListedPass[]
  /** Ids of passes that this device's log kills. */
  readonly dead: ReadonlyMap<string, string>
}

/** Verdicts of the server's list that only the server's next list takes away: a device adds blocks, it lifts none. */
const STICKS: readonly Verdict[] = ['withdrawn', 'held', 'not passed']

/** A listed entry with what this device knows besides: blocks and kills are added, none is taken away, and an issued pass appears. */
export function overlayEntry(listed: ListedEntry, own: OwnWord): ListedEntry {
  const words = new Set(listed.blocks.map(({ kind, words }) => `${kind} ${words}`))
  const blocks = [...own.blocks.filter((block) => !words.has(`${block.kind} ${block.words}`)), ...listed.blocks]
  const known = new Set(listed.passes.map(({ id }) => id))
  const passes = listed.passes.map((pass): ListedPass => {
    const why = own.dead.get(pass.id)
    return why !== undefined && pass.state !== 'dead' ? { ...pass, state: 'dead', why } : pass
  })
  return {
    ...listed,
    verdict: STICKS.includes(listed.verdict) && !STICKS.includes(own.verdict) ? listed.verdict : own.verdict,
    blocks,
    passes: [...passes, ...own.passes.filter(({ id }) => !known.has(id))],
  }
}

/** Whether the list already reflects all this device holds of a subject: nothing of it is unsent or newer than the list. */
export function isReflected(records: readonly { readonly seq: number | null }[], listSeq: number): boolean {
  return records.every(({ seq }) => seq !== null && seq <= listSeq)
}
