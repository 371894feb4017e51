import { backOffMs } from '../core/back-off'
import type { DayTools } from './day-tools'
import type { DrainOutcome } from './day-client'
import type { SyncTransport } from './sync-transport'

/** Polling while the live stream is heard, for what a poke might have missed; and without it. */
const QUIET_MS = 60_000
const POLL_MS = 10_000
/** An action is given a moment, so that the records of quick taps travel together. */
const SOON_MS = 400
/** After the stream broke, before it is tried again. */
const RECONNECT_MS = 5_000

/** Whoever tells that the network is back: `window`, or a test. */
export interface NetworkEvents {
  readonly addEventListener: (type: 'online' | 'offline', listener: () => void) => void
  readonly removeEventListener: (type: 'online' | 'offline', listener: () => void) => void
}

export interface Loop {
  /** Something was saved here: send it soon. */
  readonly kick: () => void
  readonly stop: () => void
}

export interface LoopParts {
  readonly drain: () => Promise<DrainOutcome>
  readonly transport: Pick<SyncTransport, 'live'>
  readonly tools: Pick<DayTools, 'setTimer' | 'clearTimer' | 'random'>
  readonly network: NetworkEvents | null
  readonly onLink: (link: 'live' | 'polling' | 'offline') => void
}

/** Keeps a device in step: drains when poked, when the network comes back, after each action, and by polling; backs off while nothing answers. */
export function startLoop({ drain, transport, tools, network, onLink }: LoopParts): Loop {
  let stopped = false
  let running = false
  let wanted = false
  let failures = 0
  let isLive = false
  let timer: unknown = null
  let reconnect: unknown = null
  let stopLive: (() => void) | null = null

  function schedule(ms: number): void {
    if (stopped) return
    if (timer !== null) tools.clearTimer(timer)
    timer = tools.setTimer(() => void turn(), ms)
  }

  async function turn(): Promise<void> {
    timer = null
    if (stopped) return
    if (running) {
      wanted = true
      return
    }
    running = true
    wanted = false
    const outcome = await drain()
    running = false
    if (stopped) return
    const failed = outcome.state === 'failed' && outcome.problem.code === 'offline'
    failures = outcome.state === 'failed' ? failures + 1 : 0
    onLink(failed ? 'offline' : isLive ? 'live' : 'polling')
    // Asked for while it ran: whatever was saved meanwhile may have come too late for the batch.
    if (wanted && outcome.state !== 'failed') {
      schedule(SOON_MS)
      return
    }
    schedule(outcome.state === 'failed' ? backOffMs(failures, tools.random()) : isLive ? QUIET_MS : POLL_MS)
  }

  function listen(): void {
    reconnect = null
    if (stopped) return
    stopLive = transport.live({
      onOpen: () => {
        isLive = true
        onLink('live')
      },
      onPoke: () => schedule(0),
      onEnd: () => {
        isLive = false
        onLink('polling')
        if (!stopped) reconnect = tools.setTimer(listen, RECONNECT_MS + RECONNECT_MS * tools.random())
      },
    })
  }

  const online = () => {
    failures = 0
    schedule(0)
  }
  const offline = () => onLink('offline')
  network?.addEventListener('online', online)
  network?.addEventListener('offline', offline)
  listen()
  schedule(0)
  return {
    // While nothing answers, a tap does not shorten the wait: forty phones tapping would be a storm.
    kick: () => {
      wanted = true
      if (failures === 0 && !running) schedule(SOON_MS)
    },
    stop: () => {
      stopped = true
      if (timer !== null) tools.clearTimer(timer)
      if (reconnect !== null) tools.clearTimer(reconnect)
      stopLive?.()
      network?.removeEventListener('online', online)
      network?.removeEventListener('offline', offline)
    },
  }
}
