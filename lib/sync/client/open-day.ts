import { subjectKey } from '@/lib/inspection/subject'
import { venueDay } from '@/lib/rules/venue-day'
import { dayAttention } from './day-attention'
import type { DayClient } from './day-client'
import { dayDisk } from './day-disk'
import { dayEntries } from './day-entries'
import { dayPeople } from './day-people'
import type { DayNow, DayParts } from './day-parts'
import { daySaving } from './day-saving'
import { dayStatus } from './day-status'
import { dayTraffic } from './day-traffic'
import type { DayWorld } from './day-world'
import type { KeptPhoto } from './day-photos'
import type { DeviceStore } from './device-store'
import { KEYS, type Enrolment } from './enrolment'
import { issuing } from './issuing'
import { startLoop } from './loop'
import { overlaidList } from './overlaid-list'
import { photoAccess } from './photo-access'
import { photoSending } from './photo-sending'
import { photoShelf } from './photo-shelf'
import { dayError } from './problem-of'
import { unlocking } from './unlocking'

/** How often an open page looks whether its day or its unlocking is over, ms. */
const WATCH_MS = 15_000

/** Opens the day that this device was enrolled for. Rejects with `no-key` where it was not. Everything held is read once, then served from memory. */
export async function openDay(store: DeviceStore, world: DayWorld): Promise<DayClient> {
  const enrolment = (await store.read(KEYS.enrolment)) as Enrolment | undefined
  if (enrolment === undefined) throw dayError('no-key')
  const { tools } = world
  const listeners = new Set<() => void>()
  const disk = dayDisk(store)
  const now: DayNow = { version: 0, room: await store.room(), link: 'polling', busy: null, problem: null, loop: null }
  const bump = () => {
    now.version += 1
    for (const listener of listeners) listener()
  }
  const hands = unlocking(store, enrolment, tools, bump)
  const day = () => venueDay(tools.now() + disk.pull().offset, disk.memory.snapshot()?.event.timeZone ?? 'UTC')
  await disk.read()
  await hands.refresh()
  const transport = world.transport(enrolment)
  transport.setOffset(disk.pull().offset)
  const hearing = hearOtherTabs(store, async (keys) => {
    await disk.reread(keys)
    if (keys.some((key) => key === KEYS.unlocked || key.startsWith('p:'))) await hands.refresh()
    bump()
  })
  const cars = dayEntries(disk.memory, day)
  const snapshot = dayPeople(disk)
  const photoParts = await openPhotos(store, { disk, tools, transport, bump })
  const parts: DayParts = {
    store,
    tools,
    transport,
    enrolment,
    disk,
    cars,
    snapshot,
    hands,
    ...photoParts,
    day,
    bump,
    heard: hearing.heard,
    now,
  }
  return {
    ...assemble(parts, world),
    subscribe: (listener) => {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    close: () => {
      now.loop?.stop()
      hearing.stop()
      photoParts.close()
      store.close()
    },
  }
}

/** The photographs lie in a store of their own: records are read whole at every start, and must not wait for megabytes. */
async function openPhotos(store: DeviceStore, { disk, tools, transport, bump }: Pick<DayParts, 'disk' | 'tools' | 'transport' | 'bump'>) {
  const { memory } = disk
  const own = await store.beside('photos')
  const photos = await photoShelf({ store: own, now: tools.now, isNamed: memory.namesPhoto, bump })
  const isPhotoDue = ({ hash, state }: KeptPhoto) => state === 'waits' && memory.namesPhoto(hash)
  const recordsWait = () => [...memory.stored.values()].some(({ out }) => out === 'unsent')
  const sending = photoSending({ shelf: photos, store: own, transport, tools, isDue: isPhotoDue, recordsWait })
  const close = () => {
    sending.stop()
    own.close()
  }
  return { photos, isPhotoDue, sending, close }
}

function assemble(parts: DayParts, world: DayWorld): Omit<DayClient, 'subscribe' | 'close'> {
  const { disk, cars, snapshot, hands, day, now, enrolment } = parts
  const { memory } = disk
  const save = daySaving(parts)
  const issue = issuing({ enrolment, memory, cars, snapshot, day, save })
  const traffic = dayTraffic(parts)
  const status = dayStatus(parts)
  return {
    version: () => now.version,
    status,
    snapshot,
    entries: cars.all,
    entry: cars.one,
    state: (key) => memory.state(key, day()),
    log: memory.log,
    dayLog: () => memory.log(subjectKey({ event: enrolment.says.event })),
    book: (checklistHash, limitsHash) => {
      const event = memory.snapshot()?.event
      return event === undefined ? null : memory.book(checklistHash ?? event.checklistHash, limitsHash ?? event.limitsHash)
    },
    passList: overlaidList(disk, { cars, snapshot }, day, () => now.version),
    note: (hash) => disk.notes.get(hash)?.text ?? null,
    // The records come back in the order of the drafts, each of its draft's kind: what `SavedRecords` says and the compiler cannot see.
    record: async (drafts, notes = []) => (await save(async () => drafts, notes)).saved as never,
    photos: photoAccess(parts),
    issuePass: issue.pass,
    issueBand: issue.band,
    people: hands.people,
    setPin: hands.setPin,
    unlock: hands.unlock,
    lock: hands.lock,
    touched: hands.touched,
    ...traffic,
    ...dayAttention(parts),
    start: () => start(parts, world, traffic.drain, status),
  }
}

/** Takes in what other tabs commit, one after the other, so that a later word about a key is not overtaken by an earlier one. */
function hearOtherTabs(store: DeviceStore, take: (keys: readonly string[]) => Promise<void>) {
  let tail: Promise<void> = Promise.resolve()
  const stop = store.onOtherTab((keys) => {
    tail = tail.then(() => take(keys))
  })
  return { stop, heard: () => tail }
}

function start(
  { tools, transport, bump, now, sending }: DayParts,
  world: DayWorld,
  drain: DayClient['drain'],
  status: DayClient['status'],
): () => void {
  const loop = startLoop({
    drain: async () => {
      const outcome = await drain()
      // The records are through: now the photographs, without holding up the next turn.
      if (outcome.state !== 'failed') sending.kick()
      return outcome
    },
    transport,
    tools,
    network: world.network,
    onLink: (link) => {
      if (link === now.link) return
      now.link = link
      bump()
    },
  })
  now.loop = loop
  let seen = status()
  let watch = tools.setTimer(look, WATCH_MS)
  function look(): void {
    if (status() !== seen) bump()
    seen = status()
    watch = tools.setTimer(look, WATCH_MS)
  }
  return () => {
    loop.stop()
    if (now.loop === loop) now.loop = null
    tools.clearTimer(watch)
  }
}
