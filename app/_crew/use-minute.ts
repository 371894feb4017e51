'use client'

import { useEffect, useState } from 'react'

/** The device clock, ms, moved on every few seconds; null until the page is alive. */
export function useMinute(): number | null {
  const [now, setNow] = useState<number | null>(null)
  useEffect(() => {
    const tick = () => setNow(Date.now())
    tick()
    const timer = setInterval(tick, 5_000)
    return () => clearInterval(timer)
  }, [])
  return now
}
