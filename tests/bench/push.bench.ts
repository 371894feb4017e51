import { copyFileSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { syncPush } from '@/lib/contracts/sync-push'
import { startServer } from '../support/server-process'
import { BARE_APP, buildBareApp } from './bare-app'
import { enrolBenchTablet } from './bench-tablet'
import { walkBatches } from './bench-walks'
import { median, row } from './row'
import { seedBenchDatabase } from './seed-bench-database'

const BATCHES = 60
const WARM_UP = 10
const SIZE = 50
const AIM = 0.7

const folder = mkdtempSync(join(tmpdir(), 'lockwire-bench-'))
const ours = join(folder, 'ours.db')
const bare = join(folder, 'bare.db')
buildBareApp()
seedBenchDatabase(ours)
const tablet = enrolBenchTablet(ours)
copyFileSync(ours, bare)
const batches = walkBatches(tablet, BATCHES, SIZE)
const quiet = { LOCKWIRE_LOG: 'error' }
const server = await startServer({ db: ours, env: quiet })
const bareServer = await startServer({ db: bare, app: BARE_APP, env: { BARE_KEY: tablet.publicKey, BARE_CLUB: tablet.event.clubId } })
try {
  await measure()
} catch (error) {
  process.stderr.write(`What the servers logged:\n${server.log()}\n${bareServer.log()}\n`)
  throw error
} finally {
  await server.stop()
  await bareServer.stop()
  rmSync(folder, { recursive: true, force: true })
}

/** The same batches to both, in turns and swapping who goes first, so that neither always finds the warmer machine. */
async function measure(): Promise<void> {
  const times = { push: [] as number[], bare: [] as number[] }
  for (const [index, records] of batches.entries()) {
    const first = index % 2 === 0
    if (first) times.push.push(await push(records))
    times.bare.push(await pushBare(records))
    if (!first) times.push.push(await push(records))
  }
  const pushMs = median(times.push.slice(WARM_UP))
  const bareMs = median(times.bare.slice(WARM_UP))
  // Of neighbours in time, then the middle one: a busy second of the machine touches both of a pair.
  const ratio = median(times.push.map((ms, index) => (times.bare[index] ?? ms) / ms).slice(WARM_UP))
  row({ what: `push of ${String(SIZE)} records, median of ${String(BATCHES - WARM_UP)}`, value: perSecond(pushMs) })
  row({ what: 'bare route: same signatures, same rows', value: perSecond(bareMs) })
  row({ what: 'push ÷ bare route (records/s, median of pairs)', value: ratio.toFixed(2), aim: `≥ ${String(AIM)}`, met: ratio >= AIM })
}

function perSecond(ms: number): string {
  return `${ms.toFixed(1)} ms, ${String(Math.round((SIZE / ms) * 1000))} records/s`
}

async function push(records: readonly string[]): Promise<number> {
  const body = JSON.stringify({ protocol: 1, event: tablet.event.id, certificates: [tablet.certificate], records, notes: [], unsent: 0 })
  const headers = { 'content-type': 'application/json', authorization: tablet.authorize('POST', syncPush.path, body) }
  const { ms, answer } = await timedPost(`${server.origin}${syncPush.path}`, headers, body)
  const outcomes = (answer as { answers: readonly { outcome: string; code: string | null }[] }).answers
  const other = outcomes.find(({ outcome }) => outcome !== 'stored')
  // A quarantined record would be measured on another path than the one that matters.
  if (other !== undefined || outcomes.length !== SIZE) throw new Error(`not every record was stored: ${JSON.stringify(other)}`)
  return ms
}

async function pushBare(records: readonly string[]): Promise<number> {
  const body = JSON.stringify({ event: tablet.event.id, records })
  const { ms, answer } = await timedPost(`${bareServer.origin}/api/push`, { 'content-type': 'application/json' }, body)
  if ((answer as { stored: number }).stored !== SIZE) throw new Error('the bare route did not store every record')
  return ms
}

async function timedPost(
  url: string,
  headers: Record<string, string>,
  body: string,
): Promise<{ readonly ms: number; readonly answer: unknown }> {
  const began = performance.now()
  const response = await fetch(url, { method: 'POST', headers, body })
  const text = await response.text()
  const ms = performance.now() - began
  if (!response.ok) throw new Error(`${url} answered ${String(response.status)}: ${text.slice(0, 500)}`)
  return { ms, answer: JSON.parse(text) }
}
