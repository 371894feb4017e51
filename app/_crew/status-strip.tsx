'use client'

import { useEffect, useState } from 'react'
import { Strip } from '@/app/_ui/strip'
import type { DayStatus } from '@/lib/sync/client/day-client'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'
import { clockTime } from './say-when'

/** The machine's own state in one line: what waits to be sent and since when, and the clock. Loud only when a person is needed. */
export function StatusStrip() {
  const day = useDay()
  const status = useDayStatus(day)
  const zone = day.snapshot()?.event.timeZone ?? 'UTC'
  const now = useMinute()
  return (
    <Strip
      isLoud={status.problem !== null && status.problem.code !== 'offline'}
      end={now === null ? '' : clockTime(now + status.clockOffset, zone)}
    >
      {words(status, zone)}
    </Strip>
  )
}

function words(status: DayStatus, zone: string): string {
  const link =
    status.link === 'offline' ? (status.lastPullAt === null ? 'offline' : `offline since ${clockTime(status.lastPullAt, zone)}`) : 'in step'
  const unsent = status.unsent > 0 ? `${status.unsent} to send` : 'all sent'
  const attention = status.problem && status.problem.code !== 'offline' ? ` · ${status.problem.what}` : ''
  return `${link} · ${unsent}${attention}`
}

/** The device clock, moved on every few seconds; null until the page is alive. */
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
