'use client'

import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import type { CarFacts } from '@/lib/checklist/car-facts'
import { judgedKind } from '@/lib/inspection/subject'
import { PlaceScreen } from './place-screen'
import { SubjectWalk } from './subject-walk'
import { useUndo } from './use-undo'
import { useWalk, type WalkSubject } from './use-walk'

interface WalkOrPlaceProps {
  readonly subject: WalkSubject
  readonly base: string
  /** Null for the walk from above. */
  readonly place: string | null
  readonly told: CarFacts
}

/** The walk of one subject, from above or at one of its places. */
export function WalkOrPlace({ subject, base, place, told }: WalkOrPlaceProps) {
  const walk = useWalk(subject)
  const undo = useUndo(subject)
  if (place === null) return <SubjectWalk walk={walk} base={base} told={told} undo={undo} />
  const here = walk.plan.find((one) => one.place.id === place)
  if (here) return <PlaceScreen key={place} walk={walk} here={here} base={base} undo={undo} />
  return (
    <Notice
      happened={`Nothing is asked at this place for this ${judgedKind(subject)}.`}
      todo="Go back to its places."
      actions={<Button onClick={() => goTo(base)}>All places</Button>}
      className="m-4"
    />
  )
}
