'use client'

import { lazy } from 'react'

/** The walk with its rules is most of the bay's code; finding a car does not wait for it. */
const load = () => import('./car-screen')

export const CarScreen = lazy(() => load().then((module) => ({ default: module.CarScreen })))

/** Fetches the walk once the browser has nothing better to do, so that the first tap on a car finds it here. Gives what calls it off. */
export function fetchCarScreenWhenIdle(): () => void {
  // A failure is no news: the worker keeps it as well, and the tap asks again.
  const fetchIt = () => void load().catch(() => undefined)
  // Safari has no idle callback.
  if (!('requestIdleCallback' in window)) {
    const timer = setTimeout(fetchIt, 1000)
    return () => clearTimeout(timer)
  }
  const idle = requestIdleCallback(fetchIt, { timeout: 3000 })
  return () => cancelIdleCallback(idle)
}
