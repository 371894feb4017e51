'use client'

import { Strip } from '@/app/_ui/strip'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'
import { clockTime } from './say-when'
import { statusWords } from './status-words'
import { useMinute } from './use-minute'

/** The machine's own state in one quiet line, and the clock. What a person is needed for stands below it, in full. */
export function StatusStrip() {
  const day = useDay()
  const status = useDayStatus(day)
  const zone = day.snapshot()?.event.timeZone ?? 'UTC'
  const now = useMinute()
  return <Strip end={now === null ? '' : clockTime(now + status.clockOffset, zone)}>{statusWords(status, zone)}</Strip>
}
