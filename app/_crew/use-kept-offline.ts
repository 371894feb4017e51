'use client'

import { useEffect, useState } from 'react'
import { isKeptOffline } from '@/app/_ui/new-version'

/** How long the worker may take to keep the shells the first time, and how often it is asked, ms. */
const PATIENCE_MS = 60_000
const ASK_EVERY_MS = 500

/** Whether this screen opens with the network off: `looking` while the worker is still at it, `no` where it is not to be had. */
export function useKeptOffline(path: string): 'looking' | 'yes' | 'no' {
  const [kept, setKept] = useState<'looking' | 'yes' | 'no'>('looking')
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined
    // A browser without workers is asked once: nothing will come of waiting.
    let left = 'serviceWorker' in navigator ? PATIENCE_MS / ASK_EVERY_MS : 1
    const ask = async () => {
      const isKept = await isKeptOffline(path)
      left -= 1
      if (isKept) setKept('yes')
      else if (left <= 0) setKept('no')
      else timer = setTimeout(() => void ask(), ASK_EVERY_MS)
    }
    void ask()
    return () => clearTimeout(timer)
  }, [path])
  return kept
}
