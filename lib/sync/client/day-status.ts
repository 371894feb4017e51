import { recordOfJws } from '../core/held-record'
import { LITTLE_BYTES } from './check-device'
import type { DayStatus, DevicePerson } from './day-client'
import type { DayParts } from './day-parts'
import { dayProblem } from './problem-of'

/** A device clock this far before one it once showed went backwards, ms. */
const BACKWARDS_MS = 60_000

/** Reads the day's status; the same object until something in it changes, be it only that the day is over or a person's time. */
export function dayStatus(parts: DayParts): () => DayStatus {
  let made: { readonly tag: string; readonly value: DayStatus } | null = null
  return () => {
    const unlocked = parts.hands.unlocked()
    const isBackwards = parts.tools.now() < parts.disk.pull().latestWall - BACKWARDS_MS
    const tag = `${parts.now.version} ${unlocked?.id ?? ''} ${parts.day()} ${isBackwards}`
    if (made?.tag !== tag) made = { tag, value: read(parts, unlocked, isBackwards) }
    return made.value
  }
}

function read(
  { disk, enrolment, day, now, photos, isPhotoDue }: DayParts,
  unlocked: DevicePerson | null,
  clockWentBackwards: boolean,
): DayStatus {
  const { seq, loaded, lastPullAt, lastPushAt, offset } = disk.pull()
  const event = disk.memory.snapshot()?.event
  const held = [...disk.memory.stored.values()]
  const unsent = held.filter(({ out }) => out === 'unsent')
  const refused = photos.all().filter(({ state }) => state === 'refused').length
  const needsAttention = held.filter(({ out }) => out === 'attention').length + refused
  const times = unsent.map(({ jws }) => recordOfJws(jws)?.at ?? Number.POSITIVE_INFINITY)
  const list = disk.list()
  const { device, deviceName, kid } = enrolment.says
  return {
    event:
      event === undefined ? null : { id: event.id, name: event.name, venue: event.venue, firstDay: event.firstDay, lastDay: event.lastDay },
    device: { id: device, name: deviceName, kid },
    day: day(),
    loaded: loaded && event !== undefined,
    unlocked,
    unsent: unsent.length,
    unsentSince: times.length === 0 ? null : Math.min(...times),
    photosUnsent: photos.all().filter(isPhotoDue).length,
    needsAttention,
    lastPullAt,
    lastPushAt,
    seq,
    listMadeAt: list === null ? null : list.at - offset,
    clockOffset: offset,
    clockWentBackwards,
    link: now.link,
    busy: now.busy,
    storage: now.room,
    problem: worst(now, needsAttention),
  }
}

function worst(now: DayParts['now'], needsAttention: number): DayStatus['problem'] {
  if (now.room.leftBytes !== null && now.room.leftBytes < LITTLE_BYTES) return dayProblem('storage-low')
  return needsAttention > 0 ? dayProblem('needs-attention') : now.problem
}
