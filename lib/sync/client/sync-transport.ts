import type { SyncPullRequest, SyncPullResponse } from '@/lib/contracts/sync-pull'
import type { SyncPushRequest, SyncPushResponse } from '@/lib/contracts/sync-push'

/** Why no answer came. Nothing was heard about any record, whatever the server may have done with them (rule S6). */
export type NoAnswer = 'offline' | 'not-our-server' | 'refused' | 'busy' | 'no-room' | 'too-old' | 'fault'

export type TransportReply<T> =
  | { readonly state: 'answered'; readonly value: T }
  | { readonly state: 'too-much'; readonly status: 413 | 422 }
  | { readonly state: 'unanswered'; readonly why: NoAnswer; readonly serverTime: number | null }

/** The way to the server. Never rejects. */
export interface SyncTransport {
  readonly push: (request: SyncPushRequest) => Promise<TransportReply<SyncPushResponse>>
  readonly pull: (request: SyncPullRequest) => Promise<TransportReply<SyncPullResponse>>
  /** Hears of new versions (rule S8): `onOpen` once it hears, `onPoke` at each, `onEnd` once when it is over; returns how to stop. */
  readonly live: (listener: { readonly onOpen: () => void; readonly onPoke: () => void; readonly onEnd: () => void }) => () => void
  /** Server time minus device clock, ms, that requests are signed by. */
  readonly setOffset: (offset: number) => void
}
