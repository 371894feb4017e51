import type { SyncPushResponse } from '@/lib/contracts/sync-push'

/** Most records one push may carry (rule S1). */
export const PUSH_LIMIT = 200
/** Most characters of JWS one push carries, well under the server's own limit on a body. */
export const PUSH_CHARACTERS = 1_000_000

export interface OutboxItem {
  readonly hash: string
  readonly id: string
  readonly jws: string
}

/** What is unsent, in the order it is sent, and how much of it the next batch may hold. */
export interface Outbox {
  readonly items: readonly OutboxItem[]
  readonly limit: number
}

/** What came of a push. `unanswered` is everything that is no answer: no network, 401, 409, 429, 5xx, 507, a cut reply, a captive portal's page. */
export type PushReply =
  | { readonly state: 'answered'; readonly response: SyncPushResponse }
  | { readonly state: 'too-much'; readonly status: 413 | 422 }
  | { readonly state: 'unanswered' }

export interface PushOutcome {
  readonly outbox: Outbox
  /** Answered for: stored, duplicate or quarantined. Only these leave the outbox for good (rule S6). */
  readonly answered: readonly { readonly hash: string; readonly disposition: 'accepted' | 'quarantined'; readonly code: string | null }[]
  /** Needs attention: the server would not take it. Kept until sent again or discarded by typing. */
  readonly setAside: readonly { readonly hash: string; readonly code: string }[]
  /** Whether it is worth going on at once. */
  readonly next: 'go-on' | 'back-off' | 'done'
}

/** The records of the next push, oldest first. Never empty while something is unsent, however long its text. */
export function nextBatch(outbox: Outbox): readonly OutboxItem[] {
  const batch: OutboxItem[] = []
  let characters = 0
  for (const item of outbox.items) {
    characters += item.jws.length
    if (batch.length >= Math.min(outbox.limit, PUSH_LIMIT) || (batch.length > 0 && characters > PUSH_CHARACTERS)) break
    batch.push(item)
  }
  return batch
}

/** The outbox after a push of `batch`. */
export function afterPush(outbox: Outbox, batch: readonly OutboxItem[], reply: PushReply): PushOutcome {
  if (reply.state === 'unanswered') return { outbox, answered: [], setAside: [], next: 'back-off' }
  if (reply.state === 'too-much') return halve(outbox, batch, reply.status)
  return settle(outbox, batch, reply.response)
}

function halve(outbox: Outbox, batch: readonly OutboxItem[], status: 413 | 422): PushOutcome {
  const culprit = batch.length === 1 ? batch[0] : undefined
  if (culprit === undefined) {
    const limit = Math.max(1, Math.floor(batch.length / 2))
    return { outbox: { ...outbox, limit }, answered: [], setAside: [], next: batch.length === 0 ? 'done' : 'go-on' }
  }
  const left = without(outbox.items, new Set([culprit.hash]))
  const code = status === 413 ? 'too-large' : 'not-understood'
  return {
    outbox: { items: left, limit: PUSH_LIMIT },
    answered: [],
    setAside: [{ hash: culprit.hash, code }],
    next: left.length === 0 ? 'done' : 'go-on',
  }
}

function settle(outbox: Outbox, batch: readonly OutboxItem[], response: SyncPushResponse): PushOutcome {
  const sent = new Map(batch.map((item) => [item.hash, item]))
  const answered = new Map<string, PushOutcome['answered'][number]>()
  const setAside = new Map<string, PushOutcome['setAside'][number]>()
  for (const { hash, id, outcome, code } of response.answers) {
    const item = sent.get(hash)
    // An answer for something else is no answer, even where the hash was guessed right and the id was not.
    if (item === undefined || (id !== null && id !== item.id)) continue
    if (outcome === 'refused') setAside.set(hash, { hash, code: code ?? 'refused' })
    // A duplicate carries the code it was once quarantined with.
    else answered.set(hash, { hash, disposition: code === null ? 'accepted' : 'quarantined', code })
  }
  const gone = new Set([...answered.keys(), ...setAside.keys()])
  const items = without(outbox.items, gone)
  const limit = Math.min(PUSH_LIMIT, Math.max(outbox.limit, batch.length) * 2)
  const next = items.length === 0 ? 'done' : gone.size === 0 ? 'back-off' : 'go-on'
  return { outbox: { items, limit }, answered: [...answered.values()], setAside: [...setAside.values()], next }
}

function without(items: readonly OutboxItem[], gone: ReadonlySet<string>): readonly OutboxItem[] {
  return items.filter((item) => !gone.has(item.hash))
}
