'use client'

import { useDay } from '@/app/_crew/day-context'
import { KeptPhotos } from '@/app/_crew/kept-photos'
import { clockTime } from '@/app/_crew/say-when'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { Head } from '@/lib/inspection/state'
import type { WalkItem } from '@/lib/walk/walk-plan'
import { headWords } from './head-words'

export const HEAD_SHAPES = { ok: 'ok', advisory: 'advisory', fail: 'fail', 'could-not-see': 'ask', unseen: 'none' } as const
export const HEAD_WORDS = { ok: 'ok', advisory: 'advisory', fail: 'fail', 'could-not-see': 'could not see', unseen: 'taken back' } as const

/** What has been said of this check already: who, when, on what grounds. Two who differ are both shown. */
export function HeadsSoFar({ item }: { readonly item: WalkItem }) {
  const heads = item.state?.heads ?? []
  if (heads.length === 0 && !item.seeAgain) return null
  return (
    <section className="mt-3 border-l-4 border-accent pl-3" aria-label="Said of this so far">
      {item.state?.disagreement && (
        <p className="font-bold">Two looks differ. The more severe stands until a new look, or the chief rules.</p>
      )}
      {item.seeAgain && <p className="font-bold">To be seen again: something since has touched it.</p>}
      <ul>
        {heads.map((head) => (
          <HeadLine key={head.hash} head={head} item={item} />
        ))}
      </ul>
    </section>
  )
}

function HeadLine({ head, item }: { readonly head: Head; readonly item: WalkItem }) {
  const day = useDay()
  const snapshot = day.snapshot()
  const who = snapshot?.crew.find((one) => one.id === head.record.actor)?.name ?? 'somebody of the crew'
  const grounds = headWords(head, item.check, day.note)
  return (
    <li className="flex items-start gap-2">
      <OutcomeShape state={HEAD_SHAPES[head.outcome]} className="mt-1 size-5" />
      <span>
        {clockTime(head.record.at + head.record.offset, snapshot?.event.timeZone ?? 'UTC')} {HEAD_WORDS[head.outcome]}, {who}
        {grounds === '' ? '' : `: ${grounds}`}
        {head.lapsed ? ' (of another day: see it today)' : ''}
        {head.quarantined ? ' (without the right to say so)' : ''}
        <KeptPhotos record={head.record} words={`${item.check.short}, ${HEAD_WORDS[head.outcome]}`} />
      </span>
    </li>
  )
}
