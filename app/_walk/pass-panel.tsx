'use client'

import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { subjectKey } from '@/lib/inspection/subject'
import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { forgetWalk } from '@/lib/walk/walk-memory'
import { IssuedPass } from './issued-pass'
import { livePass } from './live-pass'
import type { Walk } from './use-walk'

/** The pass of a car that has passed: issued on this device, network or none. */
export function PassPanel({ walk }: { readonly walk: Walk }) {
  const day = useDay()
  const { unlocked } = useDayStatus(day)
  const { busy, problem, act } = useAction()
  const entry = 'car' in walk.subject ? day.entry(walk.subject.car) : null
  if (!entry) return null
  const pass = livePass(walk.state, day.status().day)
  const mayIssue = can(unlocked?.roles ?? [], 'record:pass')
  const issue = async () => {
    const request = { entry: entry.id, passengerSeatUsable: walk.facts?.passengerSeat === 'used' }
    if (await act(() => day.issuePass(request))) forgetWalk(localStorage, subjectKey(walk.subject))
  }
  return (
    <section className="grid grid-cols-[minmax(0,1fr)] gap-3" aria-label="Pass">
      <ProblemNotice problem={problem} />
      {pass && <IssuedPass pass={pass} entry={entry} />}
      {!mayIssue && !pass && <p>Ready for its pass. A scrutineer issues it.</p>}
      {mayIssue && (
        <Button
          size={pass ? 'normal' : 'large'}
          look={pass ? 'quiet' : 'primary'}
          className={pass ? 'justify-self-start' : ''}
          isBusy={busy}
          onClick={() => void issue()}
        >
          {pass ? 'Issue anew (this one dies)' : `Issue the pass for ${entry.number}`}
        </Button>
      )}
    </section>
  )
}
