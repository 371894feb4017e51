import type { SyncPullResponse } from '@/lib/contracts/sync-pull'

/** Where a device stands in the event's log. */
export interface PullCursor {
  readonly seq: number
  /** Chain hash at `seq`. */
  readonly chain: string
}

export type PulledRecord = SyncPullResponse['records'][number]

export type PullOutcome =
  /** Take these in and move on to `cursor`, both in one transaction. */
  | { readonly state: 'merge'; readonly records: readonly PulledRecord[]; readonly cursor: PullCursor; readonly more: boolean }
  /** The server no longer holds the log this device knows (rule S4): send back everything held, then pull from the start. */
  | { readonly state: 'restored' }
  /** The page cannot be right: take nothing, move nothing, try again later. */
  | { readonly state: 'broken'; readonly why: string }

/** What to do with a page that answers a pull from `cursor`. The cursor never passes a record that was not taken in. */
export function mergePull(cursor: PullCursor, page: SyncPullResponse): PullOutcome {
  if (page.restored) return { state: 'restored' }
  let expected = cursor.seq
  for (const record of page.records) {
    expected += 1
    if (record.seq !== expected) return { state: 'broken', why: `record ${record.seq} came where ${expected} was due` }
  }
  const last = page.records.at(-1)
  const end: PullCursor = last === undefined ? cursor : { seq: last.seq, chain: last.chain }
  if (page.seq !== end.seq || page.chain !== end.chain)
    return { state: 'broken', why: `the page ends at ${page.seq}, its records at ${end.seq}` }
  if (page.more && page.records.length === 0) return { state: 'broken', why: 'more was promised and nothing came' }
  return { state: 'merge', records: page.records, cursor: end, more: page.more }
}
