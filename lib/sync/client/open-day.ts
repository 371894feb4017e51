import { subjectKey, type Subject } from '@/lib/inspection/subject'
import { venueDay } from '@/lib/rules/venue-day'
import { takesAway } from '../core/decide-disposition'
import { recordKey, recordOfJws, type StoredRecord } from '../core/held-record'
import { isChiefAct, mayRecord } from '../core/may-record'
import { checkDevice, ENOUGH_BYTES } from './check-device'
import { DISCARD_WORDS, type DayClient, type DayStatus, type DevicePerson, type DrainOutcome, type NeedsAttention } from './day-client'
import { dayDisk } from './day-disk'
import { dayEntries } from './day-entries'
import type { DayProblem } from './day-problem'
import type { DayWorld } from './day-world'
import { DayError } from './day-problem'
import type { DeviceStore, StoreRoom } from './device-store'
import type { Draft, DraftNote } from './draft'
import { KEYS, type Enrolment } from './enrolment'
import { issuing } from './issuing'
import { startLoop, type Loop } from './loop'
import { makeRecords, type Made, type Maker } from './make-records'
import { overlaidList } from './overlaid-list'
import { dayError, dayProblem, storageError } from './problem-of'
import { syncEngine } from './sync-engine'
import { unlocking } from './unlocking'

/** Rounds of push and pull in one drain; a restored server needs three. */
const MOST_ROUNDS = 6
/** A device clock this far before one it once showed went backwards, ms. */
const BACKWARDS_MS = 60_000
/** How often an open page looks whether its day or its unlocking is over, ms. */
const WATCH_MS = 15_000

/** Opens the day that this device was enrolled for. Rejects with `no-key` where it was not. Everything held is read once, then served from memory. */
export async function openDay(store: DeviceStore, world: DayWorld): Promise<DayClient> {
  const enrolment = (await store.read(KEYS.enrolment)) as Enrolment | undefined
  if (enrolment === undefined) throw dayError('no-key')
  const { says } = enrolment
  const { tools } = world
  const transport = world.transport(enrolment)
  const disk = dayDisk(store)
  const { memory } = disk
  const listeners = new Set<() => void>()
  const hands = unlocking(store, enrolment, tools, bump)
  await disk.read()
  await hands.refresh()
  transport.setOffset(disk.pull().offset)

  let version = 0
  let room: StoreRoom = await store.room()
  let link: DayStatus['link'] = 'polling'
  let busy: DayStatus['busy'] = null
  let lastProblem: DayProblem | null = null
  let loop: Loop | null = null
  let status: { readonly tag: string; readonly value: DayStatus } | null = null

  function bump(): void {
    version += 1
    for (const listener of listeners) listener()
  }

  function day(): string {
    return venueDay(tools.now() + disk.pull().offset, memory.snapshot()?.event.timeZone ?? 'UTC')
  }

  const cars = dayEntries(memory, day)
  const engine = syncEngine({
    store,
    tools,
    transport,
    enrolment,
    held: () => memory.stored,
    notes: () => disk.notes,
    pull: disk.pull,
    snapshotVersion: () => memory.snapshot()?.version ?? '',
    certificates: () => memory.snapshot()?.certificates ?? [],
    took: (taken) => {
      disk.took(taken)
      bump()
    },
  })

  // One after the other, so that a later word about a key is not overtaken by an earlier one.
  let hearing: Promise<void> = Promise.resolve()
  const stopHearing = store.onOtherTab((keys) => {
    hearing = hearing.then(async () => {
      await disk.reread(keys)
      if (keys.some((key) => key === KEYS.unlocked || key.startsWith('p:'))) await hands.refresh()
      bump()
    })
  })

  function of(out: StoredRecord['out']): readonly StoredRecord[] {
    return [...memory.stored.values()].filter((record) => record.out === out)
  }

  function currentStatus(): DayStatus {
    const unlocked = hands.unlocked()
    const clockWentBackwards = tools.now() < disk.pull().latestWall - BACKWARDS_MS
    const tag = `${version} ${unlocked?.id ?? ''} ${day()} ${clockWentBackwards}`
    if (status?.tag === tag) return status.value
    status = { tag, value: makeStatus(unlocked, clockWentBackwards) }
    return status.value
  }

  function makeStatus(unlocked: DevicePerson | null, clockWentBackwards: boolean): DayStatus {
    const { seq, loaded, lastPullAt, lastPushAt, offset } = disk.pull()
    const event = memory.snapshot()?.event
    const unsent = of('unsent')
    const attention = of('attention').length
    const times = unsent.map(({ jws }) => recordOfJws(jws)?.at ?? Number.POSITIVE_INFINITY)
    const list = disk.list()
    const isLow = room.leftBytes !== null && room.leftBytes < ENOUGH_BYTES / 5
    return {
      event:
        event === undefined
          ? null
          : { id: event.id, name: event.name, venue: event.venue, firstDay: event.firstDay, lastDay: event.lastDay },
      device: { id: says.device, name: says.deviceName, kid: says.kid },
      day: day(),
      loaded: loaded && event !== undefined,
      unlocked,
      unsent: unsent.length,
      unsentSince: times.length === 0 ? null : Math.min(...times),
      needsAttention: attention,
      lastPullAt,
      lastPushAt,
      seq,
      listMadeAt: list === null ? null : list.at - offset,
      clockOffset: offset,
      clockWentBackwards,
      link,
      busy,
      storage: room,
      problem: isLow ? dayProblem('storage-low') : attention > 0 ? dayProblem('needs-attention') : lastProblem,
    }
  }

  function maker(actor: string): Maker {
    return {
      store,
      enrolment: enrolment as Enrolment,
      tools,
      actor,
      offset: () => disk.pull().offset,
      day,
      seen: () => disk.pull().seq,
      shown: cars.shown,
      state: (subject: Subject) => memory.state(subjectKey(subject), day()),
      dayLog: () => memory.log(subjectKey({ event: says.event })),
      catchUp: disk.catchUp,
    }
  }

  async function save(draft: (nextPass: number) => Promise<readonly Draft[]>, notes: readonly DraftNote[]): Promise<Made> {
    const person = hands.unlocked()
    if (person === null) throw dayError('locked')
    if (memory.snapshot() === null) throw dayError('not-loaded')
    const allowed = async (nextPass: number) => {
      const drafts = await draft(nextPass)
      if (!drafts.every((one) => may(one, person))) throw dayError('not-allowed')
      return drafts
    }
    try {
      const made = await makeRecords(maker(person.id), allowed, notes)
      disk.made(made)
      hands.touched()
      return made
    } catch (error) {
      throw storageError(error)
    } finally {
      bump()
      loop?.kick()
      void store.room().then((next) => {
        room = next
      })
    }
  }

  function may(draft: Draft, person: DevicePerson): boolean {
    if (!mayRecord(draft, person.roles) || (isChiefAct(draft) && says.people.length !== 1)) return false
    if (draft.kind !== 'presented' || person.roles.includes('scrutineer') || person.roles.includes('chief')) return true
    const heads = memory.state(subjectKey(draft.subject), day()).presentedHeads
    return !takesAway(
      draft,
      heads.map(({ record }) => record),
    )
  }

  async function traffic(what: DayStatus['busy'], work: () => Promise<DrainOutcome>): Promise<DrainOutcome> {
    const outcome = await store.tryLock('sync', async () => {
      // Another tab may have been the one that pushed until now.
      await hearing
      busy = what
      bump()
      try {
        return await work()
      } catch (error) {
        return { state: 'failed', problem: storageError(error).problem, sent: 0, received: 0 } as const
      } finally {
        busy = null
      }
    })
    if (outcome === null) return { state: 'other-tab' }
    lastProblem = outcome.state === 'failed' && outcome.problem.code !== 'offline' ? outcome.problem : null
    if (outcome.state === 'failed' && outcome.problem.code === 'offline') link = 'offline'
    else if (link === 'offline') link = 'polling'
    bump()
    return outcome
  }

  async function drainOnce(progress?: (records: number, of: number) => void): Promise<DrainOutcome> {
    let [sent, received] = [0, 0]
    for (let round = 0; round < MOST_ROUNDS; round += 1) {
      const pushed = await engine.pushAll()
      sent += pushed.moved
      const pulled = await engine.pullAll(progress)
      received += pulled.moved
      const code = pushed.problem ?? pulled.problem
      if (code !== null) return { state: 'failed', problem: dayProblem(code), sent, received }
      if (!pulled.again) break
    }
    return { state: 'done', sent, received }
  }

  function outcomeOf(
    { moved, problem }: { readonly moved: number; readonly problem: DayProblem['code'] | null },
    isPush: boolean,
  ): DrainOutcome {
    const counts = { sent: isPush ? moved : 0, received: isPush ? 0 : moved }
    return problem === null ? { state: 'done', ...counts } : { state: 'failed', problem: dayProblem(problem), ...counts }
  }

  async function setOut(id: string, change: (record: StoredRecord) => StoredRecord | null): Promise<void> {
    const record = of('attention').find((one) => one.id === id)
    if (record === undefined) return
    const next = change(record)
    try {
      await store.commit({
        put: next === null ? [] : [[recordKey(record.hash), next]],
        remove: next === null ? [recordKey(record.hash)] : [],
      })
    } catch (error) {
      throw storageError(error)
    }
    if (next === null) memory.remove(record.hash)
    else memory.put([next])
    bump()
    loop?.kick()
  }

  const list = overlaidList(disk, cars, day)
  const issue = issuing({ enrolment, memory, cars, day, save })
  let attention: { readonly version: number; readonly value: readonly NeedsAttention[] } | null = null

  return {
    subscribe: (listener) => {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    version: () => version,
    status: currentStatus,
    snapshot: memory.snapshot,
    entries: cars.all,
    entry: cars.one,
    state: (key) => memory.state(key, day()),
    log: memory.log,
    dayLog: () => memory.log(subjectKey({ event: says.event })),
    book: (checklistHash, limitsHash) => {
      const event = memory.snapshot()?.event
      return event === undefined ? null : memory.book(checklistHash ?? event.checklistHash, limitsHash ?? event.limitsHash)
    },
    passList: list,
    note: (hash) => disk.notes.get(hash)?.text ?? null,
    record: async (drafts, notes = []) => (await save(async () => drafts, notes)).saved as never,
    issuePass: issue.pass,
    issueBand: issue.band,
    people: hands.people,
    setPin: hands.setPin,
    unlock: hands.unlock,
    lock: hands.lock,
    touched: hands.touched,
    loadDay: async (progress) => {
      const tell = (step: 'event' | 'records' | 'checklists' | 'device' | 'done', of: number | null = null) =>
        progress?.({ step, records: disk.pull().seq, entries: memory.snapshot()?.entries.length ?? 0, of })
      tell('event')
      const outcome = await traffic('loading', () => drainOnce((_, of) => tell('records', of)))
      if (outcome.state === 'failed') throw new DayError(outcome.problem)
      tell('checklists')
      const event = memory.snapshot()?.event
      const isLoaded = disk.pull().loaded && event !== undefined && memory.book(event.checklistHash, event.limitsHash) !== null
      tell('device')
      const check = await checkDevice(store, enrolment, isLoaded, disk.pull().lastPullAt === null ? null : disk.pull().offset)
      room = await store.room()
      tell('done')
      bump()
      return check
    },
    push: () => traffic('pushing', async () => outcomeOf(await engine.pushAll(), true)),
    pull: () => traffic('pulling', async () => outcomeOf(await engine.pullAll(), false)),
    drain: () => traffic('pushing', () => drainOnce()),
    start: () => {
      const running = startLoop({
        drain: () => traffic('pushing', () => drainOnce()),
        transport,
        tools,
        network: world.network,
        onLink: (next) => {
          if (next === link) return
          link = next
          bump()
        },
      })
      loop = running
      let watch: unknown = null
      let seen = currentStatus()
      const look = () => {
        if (currentStatus() !== seen) bump()
        seen = currentStatus()
        watch = tools.setTimer(look, WATCH_MS)
      }
      watch = tools.setTimer(look, WATCH_MS)
      return () => {
        running.stop()
        if (loop === running) loop = null
        tools.clearTimer(watch)
      }
    },
    attention: () => {
      if (attention?.version !== version) attention = { version, value: of('attention').map(needsAttention) }
      return attention.value
    },
    retry: (id) => setOut(id, (record) => ({ ...record, out: 'unsent', code: null })),
    discard: async (id, typed) => {
      if (typed.trim().toLowerCase() !== DISCARD_WORDS) throw dayError('wrong-words')
      await setOut(id, () => null)
    },
    close: () => {
      loop?.stop()
      stopHearing()
      store.close()
    },
  }
}

function needsAttention({ id, jws, code }: StoredRecord): NeedsAttention {
  const record = recordOfJws(jws)
  return {
    id,
    kind: record?.kind ?? 'unknown',
    subject: record === null ? '' : subjectKey(record.subject),
    at: record?.at ?? 0,
    code: code ?? 'refused',
    why: WHY[code ?? ''] ?? 'The server would not take it.',
  }
}

const WHY: Readonly<Record<string, string>> = {
  'too-large': 'It is too large for the server.',
  'not-understood': 'The server could not read it.',
  unreadable: 'The server could not read it.',
  'bad-signature': 'Its signature does not fit this device’s key.',
  'id-reused': 'The server holds another record of the same id.',
  'wrong-event': 'It belongs to another event.',
  'unknown-device': 'The server does not know the device that made it.',
}
