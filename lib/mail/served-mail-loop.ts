import 'server-only'
import { now } from '@/lib/platform/clock'
import { log } from '@/lib/platform/log'
import { servedDatabase } from '@/lib/platform/served-database'
import { writeWouldNotBePassed } from './commands/write-would-not-be-passed'
import { type MailLoop, startMailLoop } from './mail-loop'
import type { ReadPreChecks } from './mail-readers'
import { servedMailSender } from './served-mail-sender'

// Next bundles apart what asks for it; there is one sender a process all the same.
const holder = globalThis as typeof globalThis & { lockwireMailLoop?: MailLoop }

/** Starts this process's sender, once; it ends with the process, or before it when told to (SIGTERM). */
export function startServedMailLoop(origin: string, readPreChecks: ReadPreChecks): void {
  if (holder.lockwireMailLoop) return
  const database = servedDatabase()
  const world = { database, sender: servedMailSender(), now, random: Math.random }
  const loop = startMailLoop(world, () => writeWouldNotBePassed(database, readPreChecks, origin, now()))
  holder.lockwireMailLoop = loop
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void loop.stop())
  log.info({ mail: world.sender.kind }, 'mail is sent')
}
