'use client'

import { useDay } from '@/app/_crew/day-context'
import { ago } from '@/app/_crew/say-when'
import { useMinute } from '@/app/_crew/use-minute'
import { Button } from '@/app/_ui/button'
import { judgedKind, subjectKey } from '@/lib/inspection/subject'
import { recallWalk } from '@/lib/walk/walk-memory'
import { resumeStop } from '@/lib/walk/next-stop'
import { BandPanel } from './band-panel'
import { livePass } from './live-pass'
import { NotYet } from './not-yet'
import { NoGoAgain } from './no-go-again'
import { OpenDefects } from './open-defects'
import { openStop } from './open-stop'
import { PassPanel } from './pass-panel'
import { PlaceList } from './place-list'
import type { Walk } from './use-walk'

interface WalkOverviewProps {
  readonly walk: Walk
  readonly base: string
  /** What stands there is otherwise than was said. */
  readonly onChange: () => void
}

/** A walk that is under way: before its verdict the no-go items and what is open, then the pass or band it earned, its places, and the way on. */
export function WalkOverview({ walk, base, onChange }: WalkOverviewProps) {
  const day = useDay()
  const now = useMinute()
  const { plan, state, subject } = walk
  const left = recallWalk(localStorage, subjectKey(subject))
  const next = resumeStop(plan, left)
  const isPassed = state.verdict === 'passed' || state.verdict === 'passed with advisories'
  const isLive = livePass(state, day.status().day) !== null
  const title = plan.find(({ place }) => place.id === next?.place)?.place.title ?? ''
  const wasHere = left !== null && next?.place === left.place && next.check === left.check
  return (
    <>
      {state.presentedHeads.length > 1 && (
        <p className="border-l-8 border-accent bg-surface p-4">
          Two devices said different things of what stands here. The deeper look holds; say it once more to settle it.
        </p>
      )}
      {(next === null || isPassed) && !isLive && <NoGoAgain plan={plan} onPick={(stop) => openStop(subject, base, stop)} />}
      <OpenDefects walk={walk} base={base} />
      {isPassed ? <Earned walk={walk} /> : <NotYet walk={walk} />}
      <PlaceList plan={plan} base={base} />
      {next && (
        <Button size="large" onClick={() => openStop(subject, base, next)}>
          {wasHere ? `Go on: ${title}, you were here ${ago((now ?? left.at) - left.at)}` : `Go on: ${title}`}
        </Button>
      )}
      <Button look="quiet" className="justify-self-start" onClick={onChange}>
        {OTHERWISE[judgedKind(subject)]}
      </Button>
    </>
  )
}

const OTHERWISE = { car: 'The car is otherwise than said', person: 'Otherwise than said', fit: 'The car has become another' } as const

/** What a walk that has passed leads to. A fit earns nothing of its own: it lets this person drive this car (rule F14). */
function Earned({ walk }: { readonly walk: Walk }) {
  const kind = judgedKind(walk.subject)
  if (kind === 'car') return <PassPanel walk={walk} />
  return kind === 'person' ? (
    <BandPanel walk={walk} />
  ) : (
    <p className="font-bold">Fits this car. With a band and the car’s pass they may drive it.</p>
  )
}
