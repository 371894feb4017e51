import type { Enrolment } from './enrolment'
import { KEYS } from './enrolment'
import { IDLE_FOR_MS, UNLOCKED_FOR_MS, type DevicePerson } from './day-client'
import type { DayTools } from './day-tools'
import { hashPin, isPin, PIN_PATTERN, type StoredPin } from './pin'
import { dayError, storageError } from './problem-of'
import type { DeviceStore } from './device-store'

/** `m:unlocked`: kept on the disk so that a reload, wanted or not, does not lock a gloved hand out. */
interface Unlocked {
  readonly person: string
  readonly since: number
  readonly touched: number
}

/** Who holds the device (rule M3). */
export interface Unlocking {
  readonly people: () => readonly DevicePerson[]
  readonly unlocked: () => DevicePerson | null
  readonly setPin: (person: string, pin: string) => Promise<void>
  readonly unlock: (person: string, pin: string) => Promise<void>
  readonly lock: () => Promise<void>
  readonly touched: () => void
  /** Reads what the disk says; another tab may have unlocked or locked. */
  readonly refresh: () => Promise<void>
}

/** The time of the last tap is written at most this often, ms. */
const WRITE_TOUCH_MS = 60_000

export function unlocking(store: DeviceStore, enrolment: Enrolment, tools: DayTools, changed: () => void): Unlocking {
  const pins = new Map<string, StoredPin>()
  let held: Unlocked | null = null
  let written = 0
  let people: readonly DevicePerson[] = []

  function describe(): void {
    people = enrolment.says.people.map((person) => ({ ...person, hasPin: pins.has(person.id) }))
  }

  async function keep(next: Unlocked | null): Promise<void> {
    await commit([[KEYS.unlocked, next]])
    held = next
    written = next?.touched ?? 0
    changed()
  }

  async function commit(put: readonly (readonly [string, unknown])[]): Promise<void> {
    try {
      await store.commit({ put })
    } catch (error) {
      throw storageError(error)
    }
  }

  describe()
  return {
    people: () => people,
    unlocked: () => {
      if (held === null) return null
      const now = tools.now()
      if (now - held.since > UNLOCKED_FOR_MS || now - held.touched > IDLE_FOR_MS) return null
      return people.find(({ id }) => id === held?.person) ?? null
    },
    setPin: async (person, pin) => {
      if (!PIN_PATTERN.test(pin)) throw dayError('wrong-pin')
      const stored = await hashPin(pin, tools.randomBytes(16))
      await commit([[`p:${person}`, stored]])
      pins.set(person, stored)
      describe()
      changed()
    },
    unlock: async (person, pin) => {
      const stored = pins.get(person)
      if (stored === undefined || !(await isPin(pin, stored))) throw dayError('wrong-pin')
      const now = tools.now()
      await keep({ person, since: now, touched: now })
    },
    lock: () => keep(null),
    touched: () => {
      if (held === null) return
      held = { ...held, touched: tools.now() }
      if (held.touched - written < WRITE_TOUCH_MS) return
      written = held.touched
      // A lost write of it locks a minute early after a reload; nothing else hangs on it.
      void store.commit({ put: [[KEYS.unlocked, held]] }).catch(() => undefined)
    },
    refresh: async () => {
      held = ((await store.read(KEYS.unlocked)) as Unlocked | null | undefined) ?? null
      written = held?.touched ?? 0
      for (const [key, value] of await store.list('p:')) pins.set(key.slice(2), value as StoredPin)
      describe()
    },
  }
}
