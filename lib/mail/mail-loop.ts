import 'server-only'
import { log } from '@/lib/platform/log'
import { type MailWorld, sendDueMail } from './commands/send-due-mail'

const EVERY_MS = 2_000
/** How often it is looked whether an event is a week away. */
const PLANNED_EVERY_MS = 600_000

export interface MailLoop {
  /** Takes no further mail; resolves once those that are on their way have been noted. */
  readonly stop: () => Promise<void>
}

/** Sends what is due, every two seconds, one round at a time; `writePlanned` writes the mails that no person asks for. */
export function startMailLoop(world: MailWorld, writePlanned: () => void): MailLoop {
  let stopped = false
  let timer: ReturnType<typeof setTimeout> | undefined
  let plannedAt = 0
  let round = Promise.resolve()

  async function turn(): Promise<void> {
    try {
      if (world.now() >= plannedAt) {
        plannedAt = world.now() + PLANNED_EVERY_MS
        writePlanned()
      }
      while (!stopped) {
        const { sent, failed } = await sendDueMail(world)
        if (sent + failed === 0) break
      }
    } catch (error) {
      // The database was busy or full: the mail is still there, and so is the next round.
      log.error({ err: error }, 'a round of the mail loop failed')
    }
  }

  function again(): void {
    timer = setTimeout(() => {
      round = turn().then(() => {
        if (!stopped) again()
      })
    }, EVERY_MS)
    // Waiting for mail keeps no process alive.
    timer.unref()
  }

  again()
  return {
    stop: async () => {
      stopped = true
      clearTimeout(timer)
      await round
    },
  }
}
