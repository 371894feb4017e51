'use client'

import { lazy } from 'react'

/** The walk with its rules is most of the bay's code; finding a car does not wait for it. */
const load = () => import('./car-screen')

export const CarScreen = lazy(() => load().then((module) => ({ default: module.CarScreen })))

/** Fetches the walk while nobody waits, so that the first tap on a car finds it here. */
export function fetchCarScreen(): void {
  // A failure is no news: the worker keeps it as well, and the tap asks again.
  load().catch(() => undefined)
}
