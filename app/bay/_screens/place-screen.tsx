'use client'

import { useEffect, useRef } from 'react'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { UndoBar } from '@/app/_ui/undo-bar'
import type { WalkPlace } from '@/lib/walk/walk-plan'
import { CheckPanel } from './check-panel'
import { ClosingPanel } from './closing-panel'
import { HeadsSoFar } from './heads-so-far'
import { StopPicker } from './stop-picker'
import { usePlace } from './use-place'
import type { Walk } from './use-walk'

interface PlaceScreenProps {
  readonly walk: Walk
  readonly here: WalkPlace
  /** Address of the walk; its places stand below it. */
  readonly base: string
}

/** One place of the walk: what is asked there one by one, then one sentence for the rest. */
export function PlaceScreen({ walk, here, base }: PlaceScreenProps) {
  const now = usePlace(walk, here, base)
  const { item, stop } = now
  const heading = useRef<HTMLHeadingElement>(null)
  const count = here.oneByOne.length + (here.together.length > 0 ? 1 : 0)
  const position = item && here.oneByOne.includes(item) ? here.oneByOne.indexOf(item) + 1 : count

  // Who hears the screen is told of each new check; the first one is told by the page itself.
  const shown = useRef(stop)
  useEffect(() => {
    if (shown.current === stop) return
    shown.current = stop
    heading.current?.focus()
  }, [stop])

  return (
    <div className="flex grow flex-col px-4 pb-4">
      <h2 ref={heading} tabIndex={-1} className="pt-3 text-base text-muted outline-none">
        {here.place.title} · {position} of {count}
        {item?.check.critical ? ' · no-go item' : ''}
        {item?.seeAgain ? ' · see again' : ''}
      </h2>
      {position === 1 && <p className="text-muted">{here.place.stand}</p>}
      <StopPicker here={here} stop={stop} onPick={now.moveTo} />
      <ProblemNotice problem={now.problem} className="mt-3" />
      {item ? (
        <>
          <HeadsSoFar item={item} />
          <CheckPanel
            key={item.check.id}
            item={item}
            facts={walk.facts ?? {}}
            lastDay={walk.lastDay}
            typed={now.typed}
            onTyped={now.setTyped}
            busy={now.busy}
            onAnswer={(given, note) => {
              now.answer(item, given, note)
            }}
          />
        </>
      ) : (
        <ClosingPanel
          here={here}
          busy={now.busy}
          onClose={now.close}
          onPick={(check) => {
            now.moveTo({ place: here.place.id, check })
          }}
        />
      )}
      <UndoBar done={now.done} onUndo={now.undo} />
      <Button look="quiet" className="self-start" onClick={() => goTo(base)}>
        All places
      </Button>
    </div>
  )
}
