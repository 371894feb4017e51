'use client'

import { useDay } from '@/app/_crew/day-context'
import { clockTime } from '@/app/_crew/say-when'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { blocksOf } from '@/lib/pass/build-pass-list'
import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { LiftForm } from './lift-form'
import type { Walk } from './use-walk'

/** Holds and due recalls: why, since when, what to see again; the chief may lift a hold, with the reason in words. */
export function BlockList({ walk }: { readonly walk: Walk }) {
  const day = useDay()
  const { unlocked } = useDayStatus(day)
  const { blocks } = walk.state
  if (blocks.length === 0) return null
  const zone = day.snapshot()?.event.timeZone ?? 'UTC'
  const listed = blocksOf(walk.state, walk.book).filter(({ kind }) => kind !== 'fail')
  const holds = blocks.filter(({ kind }) => kind === 'hold' || kind === 'unknown').map(({ hash }) => hash)
  const mayLift = can(unlocked?.roles ?? [], 'record:lifted') && holds.length > 0
  return (
    <section className="border-l-8 border-line bg-surface p-4" aria-labelledby="held">
      <h2 id="held" className="flex items-center gap-2 text-lg">
        <OutcomeShape state="held" className="size-7" /> Held
      </h2>
      <ul className="mt-2 grid gap-2">
        {listed.map((block) => (
          <li key={`${block.kind} ${block.words} ${block.at}`}>
            <span className="font-bold">{block.words}</span>
            {block.at !== null && `, ${clockTime(block.at, zone)}`}
            {block.seeAgain.length > 0 && <span className="block">See again: {block.seeAgain.join(', ')}</span>}
            {block.stickerRemoved === false && <span className="block">The sticker was left on: take it off.</span>}
          </li>
        ))}
      </ul>
      {mayLift && <LiftForm subject={walk.subject} holds={holds} />}
    </section>
  )
}
