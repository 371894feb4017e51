import 'server-only'
import type { Db } from '@/db/client'
import type { live } from '@/lib/contracts/live'
import type { OutputOf } from '@/lib/contracts/contract'
import type { StreamCommand } from '@/lib/platform/command'
import { listen } from '@/lib/platform/live'
import { refuse } from '@/lib/platform/refusal'
import { eventFrame } from './event-frame'
import { logStatements } from './log-statements'

type Version = OutputOf<typeof live>

/** Answers `GET /api/events/[event]/live`: where the event stands now, then again at each change until the asker goes (rule S8). */
export const watchEvent: StreamCommand<typeof live> = ({ params }, actor, { database, signal }) => {
  const frame = eventFrame(database, params.event)
  if (frame === null || frame.event.clubId !== actor.clubId) return refuse('missing')
  if (actor.kind === 'device' && actor.eventId !== params.event) return refuse('missing')
  return versions(database, params.event, signal)
}

async function* versions(database: Db, eventId: string, signal: AbortSignal): AsyncGenerator<Version> {
  let wake: () => void = () => undefined
  let news = true
  const stop = listen(eventId, () => {
    news = true
    wake()
  })
  const onAbort = () => wake()
  signal.addEventListener('abort', onAbort)
  try {
    while (!signal.aborted) {
      // Whatever comes while one version is being sent is one version more, not ten.
      if (!news) await new Promise<void>((resolve) => (wake = resolve))
      if (signal.aborted || !news) continue
      news = false
      yield versionOf(database, eventId)
    }
  } finally {
    stop()
    signal.removeEventListener('abort', onAbort)
  }
}

function versionOf(database: Db, eventId: string): Version {
  const snapshot = eventFrame(database, eventId)?.event.snapshotVersion ?? 0
  return { seq: logStatements(database).head.get(eventId)?.seq ?? 0, snapshot }
}
