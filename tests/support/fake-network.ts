import type { SyncPullRequest, SyncPullResponse } from '@/lib/contracts/sync-pull'
import type { SyncPushRequest, SyncPushResponse } from '@/lib/contracts/sync-push'
import type { NoAnswer, SyncTransport, TransportReply } from '@/lib/sync/client/sync-transport'

/** What happens to one request. `reply-lost`: it arrives and is done, the answer does not come back. `twice`: the network delivers it twice. */
export type Fault = 'drop' | 'reply-lost' | 'twice' | NoAnswer | 413 | 422

/** The server as a network reaches it. */
export interface Reachable {
  readonly push: (request: SyncPushRequest) => Promise<TransportReply<SyncPushResponse>>
  readonly pull: (request: SyncPullRequest) => Promise<TransportReply<SyncPullResponse>>
}

/** A device's way to the server, broken as told. Everything that crosses is turned into JSON and back, as on a wire. */
export interface FakeNetwork {
  readonly transport: SyncTransport
  /** What the next requests meet, first first. */
  readonly next: (Fault | 'pass')[]
  /** Asked where nothing is queued. */
  weather: () => Fault | 'pass'
  /** Photographs the server has, by hash; taken away here, the server forgot them. */
  readonly photos: Map<string, Uint8Array<ArrayBuffer>>
  /** What the next photographs meet, first first: `refused` is what will never be taken. */
  readonly nextPhoto: ('pass' | 'drop' | 'reply-lost' | 'refused')[]
  readonly requests: { readonly what: 'push' | 'pull'; readonly records: number; readonly fault: Fault | 'pass' }[]
  /** Tells whoever listens live that something changed. */
  readonly poke: () => void
  readonly endLive: () => void
}

export function fakeNetwork(server: () => Reachable): FakeNetwork {
  const listeners = new Set<Parameters<SyncTransport['live']>[0]>()
  async function send<Q extends SyncPushRequest | SyncPullRequest, A>(
    what: 'push' | 'pull',
    request: Q,
    deliver: (request: Q) => Promise<TransportReply<A>>,
  ): Promise<TransportReply<A>> {
    const fault = network.next.shift() ?? network.weather()
    network.requests.push({ what, records: 'records' in request ? request.records.length : 0, fault })
    const wire = JSON.parse(JSON.stringify(request)) as Q
    if (fault === 413 || fault === 422) return { state: 'too-much', status: fault }
    if (fault === 'drop') return { state: 'unanswered', why: 'offline', serverTime: null }
    if (fault === 'pass' || fault === 'twice' || fault === 'reply-lost') {
      if (fault === 'twice') await deliver(wire)
      const answer = JSON.parse(JSON.stringify(await deliver(wire))) as TransportReply<A>
      return fault === 'reply-lost' ? { state: 'unanswered', why: 'offline', serverTime: null } : answer
    }
    return { state: 'unanswered', why: fault, serverTime: null }
  }
  const network: FakeNetwork = {
    next: [],
    weather: () => 'pass',
    requests: [],
    photos: new Map(),
    nextPhoto: [],
    transport: {
      putPhoto: async (hash, bytes) => {
        const fault = network.nextPhoto.shift() ?? (network.weather() === 'pass' ? 'pass' : 'drop')
        if (fault === 'refused') return { state: 'refused', code: 'photo-unreadable' }
        if (fault === 'drop') return { state: 'unanswered' }
        network.photos.set(hash, bytes)
        return fault === 'reply-lost' ? { state: 'unanswered' } : { state: 'kept' }
      },
      getPhoto: async (hash) => {
        const bytes = network.weather() === 'pass' ? network.photos.get(hash) : undefined
        return bytes === undefined ? null : new Blob([bytes], { type: 'image/jpeg' })
      },
      push: (request) => send('push', request, (wire) => server().push(wire)),
      pull: (request) => send('pull', request, (wire) => server().pull(wire)),
      live: (listener) => {
        listeners.add(listener)
        listener.onOpen()
        return () => listeners.delete(listener)
      },
      setOffset: () => undefined,
    },
    poke: () => {
      for (const listener of listeners) listener.onPoke()
    },
    endLive: () => {
      for (const listener of [...listeners]) {
        listeners.delete(listener)
        listener.onEnd()
      }
    },
  }
  return network
}
