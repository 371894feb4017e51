import type { SyncPullRequest, SyncPullResponse } from '@/lib/contracts/sync-pull'
import type { SyncPushRequest, SyncPushResponse } from '@/lib/contracts/sync-push'

/** Why no answer came. Nothing was heard about any record, whatever the server may have done with them (rule S6). */
export type NoAnswer = 'offline' | 'not-our-server' | 'refused' | 'busy' | 'no-room' | 'too-old' | 'fault'

export type TransportReply<T> =
  | { readonly state: 'answered'; readonly value: T }
  | { readonly state: 'too-much'; readonly status: 413 | 422 }
  | { readonly state: 'unanswered'; readonly why: NoAnswer; readonly serverTime: number | null }

/** What became of a photograph. `refused`: this one will never be taken; `unanswered`: whatever happened, it is sent again. */
export type PhotoReply =
  { readonly state: 'kept' } | { readonly state: 'refused'; readonly code: string } | { readonly state: 'unanswered' }

/** The way to the server. Never rejects. */
export interface SyncTransport {
  readonly push: (request: SyncPushRequest) => Promise<TransportReply<SyncPushResponse>>
  readonly pull: (request: SyncPullRequest) => Promise<TransportReply<SyncPullResponse>>
  readonly putPhoto: (hash: string, bytes: Uint8Array<ArrayBuffer>) => Promise<PhotoReply>
  /** Null where the server has none for this device, or nothing answers. */
  readonly getPhoto: (hash: string) => Promise<Blob | null>
  /** Hears of new versions (rule S8): `onOpen` once it hears, `onPoke` at each, `onEnd` once when it is over; returns how to stop. */
  readonly live: (listener: { readonly onOpen: () => void; readonly onPoke: () => void; readonly onEnd: () => void }) => () => void
  /** Server time minus device clock, ms, that requests are signed by. */
  readonly setOffset: (offset: number) => void
}
