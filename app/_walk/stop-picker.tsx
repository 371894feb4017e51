'use client'

import { useEffect, useRef } from 'react'
import { OutcomeShape, type OutcomeState } from '@/app/_ui/outcome-shape'
import type { WalkStop } from '@/lib/walk/next-stop'
import type { WalkItem, WalkPlace } from '@/lib/walk/walk-plan'

interface StopPickerProps {
  readonly here: WalkPlace
  readonly stop: WalkStop
  readonly onPick: (stop: WalkStop) => void
}

/** What this place asks, in order, each with how it stands: a skipped check leaves a visible hole, and any can be jumped to. */
export function StopPicker({ here, stop, onPick }: StopPickerProps) {
  // One of the rest, answered by itself, belongs to the rest.
  const current = here.oneByOne.some(({ check }) => check.id === stop.check) ? stop.check : null
  const stops = [
    ...here.oneByOne.map((item) => ({ check: item.check.id, words: item.check.short, state: stateOf(item), seeAgain: item.seeAgain })),
    ...(here.together.length > 0
      ? [{ check: null, words: 'the rest', state: restState(here.together), seeAgain: here.together.some((item) => item.seeAgain) }]
      : []),
  ]
  const list = useRef<HTMLOListElement>(null)
  useEffect(() => {
    const step = list.current?.querySelector<HTMLElement>('[aria-current=step]')
    // The row scrolls, the page must not: where one is stands a little in from the left.
    if (list.current && step) list.current.scrollLeft = step.offsetLeft - list.current.offsetLeft - 48
  }, [current, here])
  return (
    <ol ref={list} className="mt-2 flex gap-1 overflow-x-auto pb-1" aria-label={`Checks at ${here.place.title}`}>
      {stops.map(({ check, words, state, seeAgain }) => (
        <li key={check ?? 'rest'} className="shrink-0">
          <button
            type="button"
            aria-current={current === check ? 'step' : undefined}
            onClick={() => onPick({ place: here.place.id, check })}
            className="target flex items-center gap-2 border-b-4 border-transparent px-2 aria-[current=step]:border-accent aria-[current=step]:font-bold"
          >
            <OutcomeShape state={state} className="size-5" label={STATE_WORDS[state]} />
            {words} {seeAgain && <span className="font-normal">(again)</span>}
          </button>
        </li>
      ))}
    </ol>
  )
}

/** The shape of one check in words, for who hears it. */
export const STATE_WORDS: Readonly<Record<OutcomeState, string>> = {
  ok: 'ok',
  advisory: 'advisory',
  fail: 'fail',
  ask: 'could not see, undecided, or two looks differ',
  none: 'not seen yet',
  na: 'does not apply',
  held: 'held',
}

/** The shape of one check as it stands. */
export function stateOf(item: WalkItem): OutcomeState {
  // Two who differ are never shown as one of them, nor as a hole.
  if (item.state?.disagreement) return 'ask'
  if (item.seeAgain && item.state?.standing !== 'fail') return 'none'
  switch (item.state?.standing) {
    case 'ok':
    case 'advisory':
    case 'fail':
      return item.state.standing
    case 'could-not-see':
    case 'undecided':
      return 'ask'
    case 'does-not-apply':
      return 'na'
    default:
      return 'none'
  }
}

function restState(items: readonly WalkItem[]): OutcomeState {
  return items.every((item) => item.answered) ? 'ok' : 'none'
}
