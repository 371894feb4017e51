import 'server-only'
import { log } from '@/lib/platform/log'
import { type Refusal, refuse } from '@/lib/platform/refusal'

/** What was thrown, as the refusal a person may see; a bug is logged here and nothing of it is sent. */
export function faultOf(error: unknown, contractName: string): Refusal {
  const sqlite = error instanceof Error && 'code' in error ? String(error.code) : ''
  if (sqlite.startsWith('SQLITE_FULL')) return refuse('no-room')
  if (sqlite.startsWith('SQLITE_BUSY')) return refuse('busy', { retryAfterSeconds: 1 })
  log.error({ contract: contractName, err: error }, 'a command threw')
  return refuse('fault')
}
