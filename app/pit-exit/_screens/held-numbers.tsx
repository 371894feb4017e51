'use client'

import { isStale } from '@/lib/pass/list-age'
import type { ListedBlock, PassList } from '@/lib/pass/pass-list'
import type { PitDevice } from '@/lib/pass/pit-device'
import { readBackOf } from '@/lib/pass/read-back'

const STOPPED: ReadonlySet<ListedBlock['kind']> = new Set(['hold', 'recall', 'unknown'])

interface HeldNumbersProps {
  readonly list: PassList | null
  readonly device: PitDevice
  readonly onAsk: (number: string) => void
}

/** The hold list: every number that is held, and every one that may not run although it has had a pass, in huge digits; a press says why. */
export function HeldNumbers({ list, device, onAsk }: HeldNumbersProps) {
  const numbers = heldNumbers(list, device)
  const isOld = list === null || isStale(list, device)
  return (
    <section aria-label="Hold list" className="px-4 pb-2 pt-1">
      <h2 className="text-base">{isOld ? 'held when last heard' : 'held now'}</h2>
      {numbers.length === 0 ? (
        <p className="min-h-14 py-3">{list === null ? 'No list on this device: nobody knows.' : 'no number'}</p>
      ) : (
        <ul className="flex max-h-[24dvh] flex-wrap gap-x-5 overflow-y-auto">
          {numbers.map((number) => (
            <li key={number}>
              <button type="button" className="figures target text-5xl" aria-label={`${number}, held: why?`} onClick={() => onAsk(number)}>
                {number}
              </button>
            </li>
          ))}
        </ul>
      )}
    </section>
  )
}

/** What the list says, and what this device heard or knows besides. */
export function heldNumbers(list: PassList | null, { blocks }: Pick<PitDevice, 'blocks'>): readonly string[] {
  const here = blocks.flatMap(({ about }) => {
    if ('number' in about) return [about.number]
    return 'entry' in about ? (list?.entries.filter(({ entry }) => entry === about.entry).map(({ number }) => number) ?? []) : []
  })
  // A car that is held before it ever had a pass stands here as well: who held it looks for it.
  const held = list?.entries.filter(({ blocks: of }) => of.some(({ kind }) => STOPPED.has(kind))).map(({ number }) => number) ?? []
  const all = new Set([...(list === null ? [] : readBackOf(list).numbers), ...held, ...here])
  return [...all].sort((a, b) => a.localeCompare(b, 'en', { numeric: true }))
}
