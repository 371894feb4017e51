'use client'

import { useEffect, useState } from 'react'
import { nextStop, type WalkStop } from '@/lib/walk/next-stop'
import type { Typed } from '@/lib/walk/read-values'
import { recallWalk, rememberWalk, type Mending } from '@/lib/walk/walk-memory'
import type { WalkPlace } from '@/lib/walk/walk-plan'

/** What is being entered at a check and is not recorded yet. */
export interface Entered {
  readonly typed: Typed
  /** What was put right here and has still to be looked at again; null when nothing was. */
  readonly mending: Mending | null
  /** Hashes of the photographs that go with the answer. */
  readonly photos: readonly string[]
}

export interface Position {
  readonly stop: WalkStop
  readonly entered: Entered
  readonly setEntered: (entered: Entered) => void
  readonly moveTo: (stop: WalkStop) => void
  /** How long ago this very check was left, ms; null where the walk did not come back to it. */
  readonly awayMs: number | null
}

const NOTHING: Entered = { typed: {}, mending: null, photos: [] }

/** Which check of a place is asked and what has been entered there, kept over a reload, a call and a dead battery. */
export function usePosition(here: WalkPlace, key: string): Position {
  const [opened] = useState(() => openAt(here, key))
  const [stop, setStop] = useState(opened.stop)
  const [entered, setEntered] = useState(opened.entered)
  useEffect(() => {
    rememberWalk(localStorage, key, { ...stop, ...entered, at: Date.now() })
  }, [key, stop, entered])
  const moveTo = (next: WalkStop) => {
    setStop(next)
    setEntered(NOTHING)
  }
  return { stop, entered, setEntered, moveTo, awayMs: stop === opened.stop ? opened.awayMs : null }
}

/** At the check where the walk was left, if that is here; else at the first one without an answer. */
function openAt(here: WalkPlace, key: string): Pick<Position, 'stop' | 'entered' | 'awayMs'> {
  const left = recallWalk(localStorage, key)
  const isHere = (check: string | null) => check === null || [...here.oneByOne, ...here.together].some((item) => item.check.id === check)
  if (left?.place === here.place.id && isHere(left.check)) {
    const { place, check, typed, mending, photos, at } = left
    return { stop: { place, check }, entered: { typed, mending, photos }, awayMs: Date.now() - at }
  }
  const first = nextStop([here], null) ?? { place: here.place.id, check: here.oneByOne[0]?.check.id ?? null }
  return { stop: first, entered: NOTHING, awayMs: null }
}
