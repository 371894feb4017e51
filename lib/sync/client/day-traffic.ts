import { checkDevice } from './check-device'
import type { DayClient, DayStatus, DrainOutcome, LoadProgress } from './day-client'
import type { DayParts } from './day-parts'
import { DayError } from './day-problem'
import { dayProblem, storageError } from './problem-of'
import { syncEngine, type Stretch, type SyncEngine } from './sync-engine'

export type DayTraffic = Pick<DayClient, 'push' | 'pull' | 'drain' | 'loadDay'>

/** Rounds of push and pull in one drain: a restored server needs two, and one more where it was restored at a place that fits. */
const MOST_ROUNDS = 6
/** Loading waits for another drain this long at most: 600 × 100 ms. */
const LOAD_TRIES = 600
const LOAD_WAIT_MS = 100

/** The day's way to the server and back: one tab at a time. */
export function dayTraffic(parts: DayParts): DayTraffic {
  const engine = engineOf(parts)
  const { disk, store, now, bump } = parts

  async function alone(what: DayStatus['busy'], work: () => Promise<DrainOutcome>): Promise<DrainOutcome> {
    const outcome = await store.tryLock('sync', async () => {
      // Another tab may have been the one that pushed until now.
      await parts.heard()
      now.busy = what
      bump()
      try {
        return await work()
      } catch (error) {
        return failed(storageError(error).problem, 0, 0)
      } finally {
        now.busy = null
      }
    })
    if (outcome === null) return { state: 'other-tab' }
    note(outcome)
    return outcome
  }

  function note(outcome: DrainOutcome): void {
    const problem = outcome.state === 'failed' ? outcome.problem : null
    const isOffline = problem?.code === 'offline'
    // No network is no problem to be told of: the link says it.
    now.problem = isOffline ? null : problem
    if (isOffline) now.link = 'offline'
    else if (now.link === 'offline') now.link = 'polling'
    bump()
  }

  async function loadDay(progress?: (progress: LoadProgress) => void) {
    const tell = (step: LoadProgress['step'], of: number | null = null) =>
      progress?.({ step, records: disk.pull().seq, entries: disk.memory.snapshot()?.entries.length ?? 0, of })
    tell('event')
    const outcome = await onceAlone(() => alone('loading', () => drainWith(engine, parts.photos.sendAgain, (_, of) => tell('records', of))))
    if (outcome.state === 'failed') throw new DayError(outcome.problem)
    tell('checklists')
    const event = disk.memory.snapshot()?.event
    const isLoaded = disk.pull().loaded && event !== undefined && disk.memory.book(event.checklistHash, event.limitsHash) !== null
    tell('device')
    const check = await checkDevice(store, parts.enrolment, isLoaded, disk.pull().lastPullAt === null ? null : disk.pull().offset)
    now.room = await store.room()
    tell('done')
    bump()
    return check
  }

  /** Who loads the day waits for whoever is at it already (the loop, another tab), and then looks again itself. */
  async function onceAlone(work: () => Promise<DrainOutcome>): Promise<DrainOutcome> {
    for (let tries = 0; tries < LOAD_TRIES; tries += 1) {
      const outcome = await work()
      if (outcome.state !== 'other-tab') return outcome
      await new Promise<void>((done) => parts.tools.setTimer(done, LOAD_WAIT_MS))
    }
    return { state: 'other-tab' }
  }

  return {
    push: () => alone('pushing', async () => outcomeOf(await engine.pushAll(), true)),
    pull: () => alone('pulling', async () => outcomeOf(await engine.pullAll(), false)),
    drain: () => alone('pushing', () => drainWith(engine, parts.photos.sendAgain)),
    loadDay,
  }
}

function engineOf({ store, tools, transport, enrolment, disk, bump }: DayParts): SyncEngine {
  return syncEngine({
    store,
    tools,
    transport,
    enrolment,
    held: () => disk.memory.stored,
    notes: () => disk.notes,
    pull: disk.pull,
    snapshotVersion: () => disk.memory.snapshot()?.version ?? '',
    certificates: () => disk.memory.snapshot()?.certificates ?? [],
    took: (taken) => {
      disk.took(taken)
      bump()
    },
  })
}

/** `onRestored`: the server forgot something it once had, so nobody knows what else. */
async function drainWith(
  engine: SyncEngine,
  onRestored: () => Promise<void>,
  progress?: (records: number, of: number) => void,
): Promise<DrainOutcome> {
  let [sent, received] = [0, 0]
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const pushed = await engine.pushAll()
    sent += pushed.moved
    // A server that takes nothing may still give: what it holds may stop a car.
    const pulled = await engine.pullAll(progress)
    received += pulled.moved
    const code = pushed.problem ?? pulled.problem
    if (code !== null) return failed(dayProblem(code), sent, received)
    if (!pulled.again) break
    await onRestored()
  }
  return { state: 'done', sent, received }
}

function outcomeOf({ moved, problem }: Stretch, isPush: boolean): DrainOutcome {
  const [sent, received] = isPush ? [moved, 0] : [0, moved]
  return problem === null ? { state: 'done', sent, received } : failed(dayProblem(problem), sent, received)
}

function failed(problem: DayError['problem'], sent: number, received: number): DrainOutcome {
  return { state: 'failed', problem, sent, received }
}
