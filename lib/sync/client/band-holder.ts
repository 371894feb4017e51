import { isKnown } from '@/lib/inspection/record'
import { subjectKey } from '@/lib/inspection/subject'
import type { DayClient } from './day-client'
import type { DayMemory } from './day-memory'

interface BandsHere {
  readonly memory: Pick<DayMemory, 'log'>
  readonly snapshot: DayClient['snapshot']
  readonly day: () => string
}

/**
 * Who else was given a band of this number today, by name; null where nobody was. A band that died since counts too: it may still be on a wrist, and the
 * marshal reads wrists.
 */
export function bandHolder({ memory, snapshot, day }: BandsHere, number: string, person: string): string | null {
  const today = day()
  const has = (id: string) =>
    memory
      .log(subjectKey({ person: id }))
      .some(({ record }) => isKnown(record) && record.kind === 'band' && record.bandNumber === number && record.day === today)
  return snapshot()?.people.find(({ id }) => id !== person && has(id))?.name ?? null
}
