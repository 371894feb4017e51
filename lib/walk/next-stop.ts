import type { WalkPlace } from './walk-plan'

/** Where the walk stands or goes next: a check of a place, or the closing sentence of the place. */
export interface WalkStop {
  readonly place: string
  /** Check id; null for the place's closing sentence. */
  readonly check: string | null
}

/** The next thing without an answer after `from` (or from the start), once round; null when all is answered. */
export function nextStop(plan: readonly WalkPlace[], from: WalkStop | null): WalkStop | null {
  const stops = plan.flatMap(stopsOf)
  const start = from === null ? 0 : startAfter(stops, from)
  const next = [...stops.slice(start), ...stops.slice(0, start)].find((stop) => stop.open)
  return next ? { place: next.place, check: next.check } : null
}

/** Where an answer at `from` leads: to what is left at its place first, then to the next place with a hole, once round; null when all is answered. */
export function stopAfter(plan: readonly WalkPlace[], from: WalkStop): WalkStop | null {
  const here = plan.filter(({ place }) => place.id === from.place)
  return nextStop(here, from) ?? nextStop(plan, from)
}

/** Where a walk goes on: at the very thing where it was left while that has no answer yet, else at the next one. */
export function resumeStop(plan: readonly WalkPlace[], left: WalkStop | null): WalkStop | null {
  const isOpen = left !== null && plan.some((place) => place.place.id === left.place && isOpenAt(place, left.check))
  return isOpen ? { place: left.place, check: left.check } : nextStop(plan, left)
}

function isOpenAt({ oneByOne, together }: WalkPlace, check: string | null): boolean {
  if (check === null) return together.some((item) => !item.answered)
  return [...oneByOne, ...together].some((item) => item.check.id === check && !item.answered)
}

type PlannedStop = WalkStop & { readonly open: boolean }

function startAfter(stops: readonly PlannedStop[], from: WalkStop): number {
  const own = stops.findIndex((stop) => stop.place === from.place && stop.check === from.check)
  if (own >= 0) return own + 1
  // One of the rest, answered by itself, leads back to the rest; one that is no longer asked, to its place.
  const rest = stops.findIndex((stop) => stop.place === from.place && stop.check === null)
  return Math.max(rest >= 0 ? rest : stops.findIndex((stop) => stop.place === from.place), 0)
}

function stopsOf({ place, oneByOne, together }: WalkPlace): readonly PlannedStop[] {
  const single = oneByOne.map((item) => ({ place: place.id, check: item.check.id, open: !item.answered }))
  const rest = { place: place.id, check: null, open: together.some((item) => !item.answered) }
  return together.length > 0 ? [...single, rest] : single
}
