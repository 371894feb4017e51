import { subjectKey } from '@/lib/inspection/subject'
import { recordKey, recordOfJws, type StoredRecord } from '../core/held-record'
import { DISCARD_WORDS, type DayClient, type NeedsAttention } from './day-client'
import type { DayParts } from './day-parts'
import type { KeptPhoto } from './day-photos'
import { dayError, storageError } from './problem-of'

/** Records the server would not take: shown, sent again when asked, thrown away only by typing (rule S6). */
export function dayAttention(parts: DayParts): Pick<DayClient, 'attention' | 'retry' | 'discard'> {
  const { disk, store, now, bump, photos, sending } = parts
  let made: { readonly version: number; readonly value: readonly NeedsAttention[] } | null = null

  function waiting(): readonly StoredRecord[] {
    return [...disk.memory.stored.values()].filter(({ out }) => out === 'attention')
  }

  const refused = () => photos.all().filter(({ state }) => state === 'refused')

  /** A photograph is known by its hash, which no record's id is. */
  async function settlePhoto(hash: string, change: (photo: KeptPhoto) => KeptPhoto | null): Promise<boolean> {
    if (!refused().some((one) => one.hash === hash)) return false
    try {
      await photos.change(hash, change)
    } catch (error) {
      throw storageError(error)
    }
    sending.kick()
    return true
  }

  async function settle(id: string, change: (record: StoredRecord) => StoredRecord | null): Promise<void> {
    const record = waiting().find((one) => one.id === id)
    if (record === undefined) return
    const key = recordKey(record.hash)
    const next = change(record)
    try {
      await store.commit(next === null ? { put: [], remove: [key] } : { put: [[key, next]] })
    } catch (error) {
      throw storageError(error)
    }
    if (next === null) disk.memory.remove(record.hash)
    else disk.memory.put([next])
    bump()
    now.loop?.kick()
  }

  return {
    attention: () => {
      if (made?.version !== now.version)
        made = { version: now.version, value: [...waiting().map(describe), ...refused().map(describePhoto)] }
      return made.value
    },
    retry: async (id) => {
      if (await settlePhoto(id, (photo) => ({ ...photo, state: 'waits', code: null }))) return
      await settle(id, (record) => ({ ...record, out: 'unsent', code: null }))
    },
    discard: async (id, typed) => {
      if (typed.trim().toLowerCase() !== DISCARD_WORDS) throw dayError('wrong-words')
      if (!(await settlePhoto(id, () => null))) await settle(id, () => null)
    },
  }
}

const WHY: Readonly<Record<string, string>> = {
  'too-large': 'It is too large for the server.',
  'not-understood': 'The server could not read it.',
  unreadable: 'The server could not read it.',
  'bad-signature': 'Its signature does not fit the key of this device.',
  'id-reused': 'The server holds another record of the same id.',
  'wrong-event': 'It belongs to another event.',
  'unknown-device': 'The server does not know the device that made it.',
}

function describe({ id, jws, code }: StoredRecord): NeedsAttention {
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

function describePhoto({ hash, keptAt, code }: KeptPhoto): NeedsAttention {
  const why = 'The server would not take this photograph. What was recorded with it has its own way.'
  return { id: hash, kind: 'photograph', subject: 'event:', at: keptAt, code: code ?? 'refused', why }
}
