'use client'

import { lazy, Suspense, useState } from 'react'
import { Button } from '@/app/_ui/button'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'

// Hardly ever needed; kept on the device with everything else.
const NeedsAttention = lazy(() => import('./needs-attention').then((module) => ({ default: module.NeedsAttention })))

/** What this device needs a person for: too little room, a record the server would not take. One loud line that opens to what was kept and what to do. */
export function MachineProblem() {
  const { problem, needsAttention } = useDayStatus(useDay())
  const [isOpen, setOpen] = useState(false)
  // No network is a state and not a problem: the strip says it.
  const loud = problem?.code === 'offline' ? null : problem
  return (
    <>
      <div role="alert">
        {loud && (
          <details className="bg-ink px-4 text-ground">
            <summary className="target focus-on-fill flex items-center font-bold">{loud.what} What to do …</summary>
            <p className="pb-2">{loud.kept}</p>
            <p className="pb-3">{loud.todo}</p>
          </details>
        )}
      </div>
      {needsAttention > 0 && (
        <Button look="secondary" className="m-4" onClick={() => setOpen(true)}>
          Needs attention: {needsAttention}
        </Button>
      )}
      {isOpen && (
        <Suspense>
          <NeedsAttention onClose={() => setOpen(false)} />
        </Suspense>
      )}
    </>
  )
}
