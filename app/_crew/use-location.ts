'use client'

import { useSyncExternalStore } from 'react'

const MOVED = 'lockwire:moved'
let moved = false

/**
 * The path of the address bar inside a crew shell. A shell kept by the worker answers for every address below it, so the router's own
 * parameters cannot be known there: the path is read in the browser, and is `null` while the server renders.
 */
export function useLocation(): string | null {
  return useSyncExternalStore(subscribe, readPath, () => null)
}

/** Goes to another screen of the same shell without a request. */
export function goTo(path: string): void {
  if (path === window.location.pathname) return
  moved = true
  window.history.pushState(null, '', path)
  window.dispatchEvent(new Event(MOVED))
  window.scrollTo(0, 0)
}

/** Whether this page has gone anywhere since it was loaded. */
export function hasMoved(): boolean {
  return moved
}

function readPath(): string {
  return window.location.pathname
}

function subscribe(listener: () => void): () => void {
  window.addEventListener('popstate', listener)
  window.addEventListener(MOVED, listener)
  return () => {
    window.removeEventListener('popstate', listener)
    window.removeEventListener(MOVED, listener)
  }
}
