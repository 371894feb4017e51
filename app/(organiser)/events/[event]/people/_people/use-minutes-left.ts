'use client'

import { useEffect, useState } from 'react'

/** Minutes left until an instant (ms), a begun one counting; 0 when it is over. Moves by itself. */
export function useMinutesLeft(until: number): number {
  const [now, setNow] = useState(() => Date.now())
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), 5_000)
    return () => clearInterval(timer)
  }, [])
  return Math.max(0, Math.ceil((until - now) / 60_000))
}
