'use client'

import { crewName } from '@/app/_crew/crew-name'
import { useDay } from '@/app/_crew/day-context'
import { clockTime } from '@/app/_crew/say-when'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { BookCheck } from '@/lib/checklist/book'
import type { Head } from '@/lib/inspection/state'
import { headWords } from './head-words'
import { HEAD_SHAPES, HEAD_WORDS } from './heads-so-far'

/** Every look at a check that stands, beside each other: what, who, when, and on what grounds. */
export function LooksSideBySide({ heads, check }: { readonly heads: readonly Head[]; readonly check: BookCheck | null }) {
  const day = useDay()
  const zone = day.snapshot()?.event.timeZone ?? 'UTC'
  return (
    <ul className={heads.length > 1 ? 'grid grid-cols-2 gap-3' : 'grid'} aria-label="The looks that differ">
      {heads.map((head) => (
        <li key={head.hash} className="border-2 border-line p-3 wrap-anywhere">
          <p className="flex items-center gap-2 text-xl font-bold">
            <OutcomeShape state={HEAD_SHAPES[head.outcome]} className="size-7" />
            {HEAD_WORDS[head.outcome]}
          </p>
          <p>
            {crewName(day, head.record.actor)}, {clockTime(head.record.at + head.record.offset, zone)}
          </p>
          {check && <p>{headWords(head, check, day.note)}</p>}
          {head.quarantined && <p>Without the right to say so.</p>}
        </li>
      ))}
    </ul>
  )
}
