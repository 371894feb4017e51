'use client'

import { useDayStatus } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'

/** What this device needs a person for: too little room, a record the server would not take. One loud line that opens to what was kept and what to do. */
export function MachineProblem() {
  const { problem } = useDayStatus(useDay())
  // No network is a state and not a problem: the strip says it.
  const loud = problem?.code === 'offline' ? null : problem
  return (
    <div role="alert">
      {loud && (
        <details className="bg-ink px-4 text-ground">
          <summary className="target focus-on-fill flex items-center font-bold">{loud.what} What to do …</summary>
          <p className="pb-2">{loud.kept}</p>
          <p className="pb-3">{loud.todo}</p>
        </details>
      )}
    </div>
  )
}
