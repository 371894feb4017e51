'use client'

import { Button } from '@/app/_ui/button'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'
import { ProblemNotice } from './problem-notice'
import { useAction } from './use-action'

/** Who holds the device, and a way to give it to somebody else: a record says who was unlocked (rule M3). */
export function HandOver() {
  const day = useDay()
  const { unlocked } = useDayStatus(day)
  const { busy, problem, act } = useAction()
  if (unlocked === null) return null
  return (
    <div className="mt-auto border-t border-line pt-3">
      <p className="flex flex-wrap items-center gap-x-3 text-muted">
        Held by {unlocked.name}, {unlocked.roles.join(', ')}
        <Button look="quiet" isBusy={busy} onClick={() => void act(day.lock)}>
          Hand it over
        </Button>
      </p>
      <ProblemNotice problem={problem} />
    </div>
  )
}
