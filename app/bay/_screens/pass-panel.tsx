'use client'

import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { qrText } from '@/lib/pass/qr-text'
import { showTypedCode, typedCode } from '@/lib/pass/typed-code'
import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { PassLabel } from './pass-label'
import type { Walk } from './use-walk'

/** The pass of a car that has passed: issued on this device, network or none, shown as a code and printed as two labels. */
export function PassPanel({ walk }: { readonly walk: Walk }) {
  const day = useDay()
  const { unlocked } = useDayStatus(day)
  const { busy, problem, act } = useAction()
  const entry = 'car' in walk.subject ? day.entry(walk.subject.car) : null
  const event = day.snapshot()?.event
  if (!entry || !event) return null
  const live = walk.state.passes.filter(
    ({ state, record }) => state === 'live' && record.kind === 'pass' && record.day === day.status().day,
  )
  const pass = live.at(-1)
  const mayIssue = can(unlocked?.roles ?? [], 'record:pass')

  const issue = async () => {
    await act(async () => {
      await day.issuePass({ entry: entry.id, passengerSeatUsable: walk.facts?.passengerSeat === 'used' })
    })
  }

  return (
    <section className="grid gap-3" aria-label="Pass">
      <ProblemNotice problem={problem} />
      {!pass && !mayIssue && <p>Ready for its pass. A scrutineer issues it.</p>}
      {!pass && mayIssue && (
        <Button size="large" isBusy={busy} onClick={() => void issue()}>
          Issue the pass for {entry.number}
        </Button>
      )}
      {pass && (
        <>
          <PassLabel
            number={entry.number}
            plate={entry.plate}
            day={pass.record.day}
            venue={event.venue}
            text={qrText(event.publicOrigin, 'token' in pass.record ? pass.record.token : '')}
            code={showTypedCode(typedCode('token' in pass.record ? pass.record.token : ''))}
          />
          {pass.conditions.length > 0 && <p className="font-bold">Runs only with: {pass.conditions.join('; ')}</p>}
          <p className="text-muted">
            Seen on the day, without dismantling: no certificate and no warranty. What could not be seen is listed below. Two labels print,
            for left and right of the screen.
          </p>
          <div className="flex flex-wrap gap-3">
            <Button look="secondary" onClick={() => window.print()}>
              Print both labels
            </Button>
            {mayIssue && (
              <Button look="quiet" isBusy={busy} onClick={() => void issue()}>
                Issue anew (this one dies)
              </Button>
            )}
          </div>
        </>
      )}
    </section>
  )
}
