import { backOffMs } from '../core/back-off'
import type { KeptPhoto } from './day-photos'
import type { DayTools } from './day-tools'
import type { DeviceStore } from './device-store'
import type { PhotoShelf } from './photo-shelf'
import type { SyncTransport } from './sync-transport'

export interface PhotoSending {
  /** Sends what waits, one after the other, until nothing waits or one does not arrive; gives how many arrived. */
  readonly sendAll: () => Promise<number>
  /** Records have just travelled, or a photograph was named: a good moment. While nothing arrives, it does not shorten the wait. */
  readonly kick: () => void
  readonly stop: () => void
}

export interface PhotoSendingParts {
  readonly shelf: PhotoShelf
  readonly store: DeviceStore
  readonly transport: Pick<SyncTransport, 'putPhoto'>
  readonly tools: Pick<DayTools, 'setTimer' | 'clearTimer' | 'random'>
  /** Waits, and a record names it. */
  readonly isDue: (photo: KeptPhoto) => boolean
  /** A record is still to be sent: it goes first (rule S9). */
  readonly recordsWait: () => boolean
}

/** Sends photographs beside the records and after them: a lock and a rhythm of its own, so that no record waits for one. */
export function photoSending({ shelf, store, transport, tools, isDue, recordsWait }: PhotoSendingParts): PhotoSending {
  let [running, stopped, failures] = [false, false, 0]
  let timer: unknown = null

  async function sendAll(): Promise<number> {
    return (await store.tryLock('photos', sendEach)) ?? 0
  }

  async function sendEach(): Promise<number> {
    for (let sent = 0; ; sent += 1) {
      const photo = shelf.all().find(isDue)
      if (photo === undefined || stopped || recordsWait()) return sent
      if (!(await sendOne(photo))) {
        failures += 1
        return sent
      }
      failures = 0
    }
  }

  /** Whether the server said something of this photograph, be it that it will not have it. */
  async function sendOne({ hash }: KeptPhoto): Promise<boolean> {
    const bytes = await shelf.bytes(hash)
    if (bytes === null) {
      await shelf.change(hash, () => null)
      return true
    }
    const reply = await transport.putPhoto(hash, bytes)
    if (reply.state === 'unanswered') return false
    await shelf.change(hash, (photo) =>
      reply.state === 'kept' ? { ...photo, state: 'sent', code: null } : { ...photo, state: 'refused', code: reply.code },
    )
    return true
  }

  async function turn(): Promise<void> {
    timer = null
    if (stopped || running) return
    running = true
    try {
      await sendAll()
    } finally {
      running = false
    }
    if (!stopped && failures > 0 && timer === null) timer = tools.setTimer(() => void turn(), backOffMs(failures, tools.random()))
  }

  return {
    sendAll,
    kick: () => {
      if (timer === null && !running) timer = tools.setTimer(() => void turn(), 0)
    },
    stop: () => {
      stopped = true
      if (timer !== null) tools.clearTimer(timer)
    },
  }
}
