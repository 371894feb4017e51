'use client'

import { useDay } from '@/app/_crew/day-context'
import { ago } from '@/app/_crew/say-when'
import { useMinute } from '@/app/_crew/use-minute'
import { Button } from '@/app/_ui/button'
import { subjectKey } from '@/lib/inspection/subject'
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
      {isPassed ? 'car' in subject ? <PassPanel walk={walk} /> : <BandPanel walk={walk} /> : <NotYet walk={walk} />}
      <PlaceList plan={plan} base={base} />
      {next && (
        <Button size="large" onClick={() => openStop(subject, base, next)}>
          {wasHere ? `Go on: ${title}, you were here ${ago((now ?? left.at) - left.at)}` : `Go on: ${title}`}
        </Button>
      )}
      <Button look="quiet" className="justify-self-start" onClick={onChange}>
        {'car' in subject ? 'The car is otherwise than said' : 'Otherwise than said'}
      </Button>
    </>
  )
}
