'use client'

import { useDay } from '@/app/_crew/day-context'
import { recallsOf } from '@/app/_crew/recalls-here'
import { useChiefsDevice } from '@/app/_crew/use-chiefs-device'
import { useMinute } from '@/app/_crew/use-minute'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { standsAgainst } from '@/lib/inspection/stands-against'
import { AgainstLine } from './against-line'
import { LiftForm } from './lift-form'
import type { Walk } from './use-walk'

/** What stands against it: holds and due recalls with why, since when, by whom and what to see again; then the recalls to come. The chief may lift. */
export function BlockList({ walk }: { readonly walk: Walk }) {
  const day = useDay()
  const isChief = useChiefsDevice()
  const now = useMinute()
  const { state, subject } = walk
  const all = standsAgainst([...day.log(state.key), ...day.dayLog()], state.key, state)
  const byClock = new Set(now === null ? [] : recallsOf(day, subject, now).map(({ hash }) => hash))
  const isUp = ({ hash, state: stands }: (typeof all)[number]) => stands === 'standing' || (stands === 'waiting' && byClock.has(hash))
  const standing = all.filter(isUp)
  const waiting = all.filter((one) => one.state === 'waiting' && !isUp(one))
  const mayBeLifted = all.filter(({ kind, state: stands }) => stands !== 'ended' && kind !== 'wet')
  return (
    <>
      {standing.length > 0 && (
        <section className="border-l-8 border-line bg-surface p-4" aria-labelledby="held">
          <h2 id="held" className="flex items-center gap-2 text-lg">
            <OutcomeShape state="held" className="size-7" /> Held
          </h2>
          <ul className="mt-2 grid gap-4">
            {standing.map((against) => (
              <AgainstLine key={against.hash} against={against} walk={walk} isByClock={byClock.has(against.hash)} />
            ))}
          </ul>
        </section>
      )}
      {waiting.length > 0 && (
        <section className="border-l-8 border-accent bg-surface p-4" aria-labelledby="recalls">
          <h2 id="recalls" className="text-lg">
            To be shown again
          </h2>
          <ul className="mt-2 grid gap-4">
            {waiting.map((against) => (
              <AgainstLine key={against.hash} against={against} walk={walk} isByClock={false} />
            ))}
          </ul>
        </section>
      )}
      {isChief && mayBeLifted.length > 0 && <LiftForm walk={walk} against={mayBeLifted} />}
    </>
  )
}
