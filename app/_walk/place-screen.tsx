'use client'

import { ProblemNotice } from '@/app/_crew/problem-notice'
import { ago } from '@/app/_crew/say-when'
import { useArrival } from '@/app/_crew/use-arrival'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { UndoBar } from '@/app/_ui/undo-bar'
import type { WalkPlace } from '@/lib/walk/walk-plan'
import { CheckPanel } from './check-panel'
import { ClosingPanel } from './closing-panel'
import { DeclaredHere } from './declared-here'
import { HeadsSoFar } from './heads-so-far'
import { StopPicker } from './stop-picker'
import type { Undo } from './use-undo'
import { usePlace, type PlaceNow } from './use-place'
import type { Walk } from './use-walk'

interface PlaceScreenProps {
  readonly walk: Walk
  readonly here: WalkPlace
  /** Address of the walk; its places stand below it. */
  readonly base: string
  readonly undo: Undo
}

/** Back after less than this is no interruption, ms. */
const NOT_AWAY_MS = 60_000

/** One place of the walk: what is asked there one by one, then one sentence for the rest. */
export function PlaceScreen({ walk, here, base, undo }: PlaceScreenProps) {
  const now = usePlace(walk, here, base, undo)
  const { item, stop, awayMs } = now
  return (
    <div className="flex grow flex-col px-4 pb-4">
      <PlaceHeading here={here} now={now} />
      {awayMs !== null && awayMs >= NOT_AWAY_MS && <p className="font-bold">You were here, {ago(awayMs)}.</p>}
      <StopPicker here={here} stop={stop} onPick={now.moveTo} />
      <ProblemNotice problem={now.problem} className="mt-3" />
      {item ? (
        <>
          <HeadsSoFar item={item} />
          <DeclaredHere subject={walk.subject} check={item.check} />
          <CheckPanel
            key={item.check.id}
            item={item}
            facts={walk.facts ?? {}}
            lastDay={walk.lastDay}
            entered={now.entered}
            setEntered={now.setEntered}
            busy={now.busy}
            onAnswer={(given, note, photos) => now.answer(item, given, note, photos)}
          />
        </>
      ) : (
        <ClosingPanel here={here} busy={now.busy} onClose={now.close} onPick={(check) => now.moveTo({ place: here.place.id, check })} />
      )}
      <UndoBar done={undo.done} onUndo={now.takeBack} />
      <Button look="quiet" className="self-start" onClick={() => goTo(base)}>
        All places
      </Button>
    </div>
  )
}

/** Which place, how far through it, and what is special about the check that is asked. */
function PlaceHeading({ here, now }: { readonly here: WalkPlace; readonly now: PlaceNow }) {
  const { item, stop } = now
  // Who hears the screen is told of each new check.
  const heading = useArrival<HTMLHeadingElement>(`${stop.place} ${stop.check ?? ''}`)
  const count = here.oneByOne.length + (here.together.length > 0 ? 1 : 0)
  const position = item && here.oneByOne.includes(item) ? here.oneByOne.indexOf(item) + 1 : count
  return (
    <>
      <h2 ref={heading} tabIndex={-1} className="pt-3 text-base text-muted outline-none">
        {here.place.title} · {position} of {count}
        {item?.check.critical ? ' · no-go item' : ''}
        {item?.seeAgain ? ' · see again' : ''}
      </h2>
      {position === 1 && <p className="text-muted">{here.place.stand}</p>}
    </>
  )
}
