import type { ListedEntry, ListedPass, PassList } from './pass-list'
import type { PassPayload } from './pass-payload'

/** What was asked about: the entry, and its pass as the list has it and as the scanned code says. */
export interface PitFound {
  readonly list: PassList
  readonly entry: ListedEntry
  /** Null where this pass is not on the list. */
  readonly listed: ListedPass | null
  /** What the camera read; null for a number or a typed code. */
  readonly scanned: { readonly payload: PassPayload; readonly typedCode: string } | null
}
