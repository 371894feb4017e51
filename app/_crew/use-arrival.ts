'use client'

import { useEffect, useRef, type RefObject } from 'react'
import { hasMoved } from './use-location'

/**
 * Moves the focus to the element whenever `what` is something else than before, so that keyboard and screen reader arrive where the eye does. The first
 * screen of a page is left alone: the page itself is what is read there.
 */
export function useArrival<E extends HTMLElement>(what: string): RefObject<E | null> {
  const element = useRef<E>(null)
  const before = useRef(hasMoved() ? null : what)
  useEffect(() => {
    if (before.current === what) return
    before.current = what
    element.current?.focus()
  }, [what])
  return element
}
