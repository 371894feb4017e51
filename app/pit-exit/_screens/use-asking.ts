'use client'

import { useCallback, useRef, useState } from 'react'
import type { Aboard } from '@/lib/pass/decide-aboard'
import type { PassList } from '@/lib/pass/pass-list'
import { readScan, type PitAsk } from '@/lib/pass/pit-ask'
import { verifyInBrowser } from './verify-in-browser'

/** What stands on the screen now: what was asked, and who the marshal said is aboard. */
export interface Asked {
  readonly ask: PitAsk
  readonly aboard: Aboard | null
  /** What the marshal keyed in; empty for a scan, whose text is never shown. */
  readonly typed: string
}

export interface Asking {
  readonly asked: Asked | null
  /** Takes a text from the camera. It is parsed and never opened, shown or kept. */
  readonly scan: (text: string) => void
  readonly askNumber: (number: string) => void
  readonly askCode: (code: string) => void
  readonly setAboard: (aboard: Aboard) => void
  /** Back to the camera. */
  readonly next: () => void
}

/** One question at a time: while an answer stands, the camera is not listened to. */
export function useAsking(list: PassList | null): Asking {
  const [asked, setAsked] = useState<Asked | null>(null)
  const isBusy = useRef(false)

  const put = useCallback((ask: PitAsk, typed: string) => {
    isBusy.current = true
    setAsked({ ask, aboard: null, typed })
  }, [])

  const scan = useCallback(
    (text: string) => {
      if (isBusy.current) return
      isBusy.current = true
      void readScan(text, list, verifyInBrowser).then((read) => put({ how: 'camera', scan: read }, ''))
    },
    [list, put],
  )

  return {
    asked,
    scan,
    askNumber: (number) => put({ how: 'number', number }, number),
    askCode: (code) => put({ how: 'typed', code }, code),
    setAboard: (aboard) => setAsked((now) => now && { ...now, aboard }),
    next: () => {
      isBusy.current = false
      setAsked(null)
    },
  }
}
