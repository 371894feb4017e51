'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { showTypedCode, typedCode } from '@/lib/pass/typed-code'
import { subjectKey } from '@/lib/inspection/subject'
import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { forgetWalk } from '@/lib/walk/walk-memory'
import { livePass } from './live-pass'
import type { Walk } from './use-walk'

/** The wristband of a person whose helmet and kit have passed: its printed number is keyed in, and the band lives from then on. */
export function BandPanel({ walk }: { readonly walk: Walk }) {
  const day = useDay()
  const { unlocked } = useDayStatus(day)
  const record = livePass(walk.state, day.status().day)?.record
  const band = record?.kind === 'band' ? record : null
  return (
    <section className="grid gap-3" aria-label="Band">
      {band && (
        <p className="flex items-center gap-3 text-xl font-bold">
          <OutcomeShape state="ok" className="size-8" /> Band {band.bandNumber}
        </p>
      )}
      {band && (
        <p className="text-muted">
          Its code: <span className="serial">{showTypedCode(typedCode(band.token))}</span>
        </p>
      )}
      {can(unlocked?.roles ?? [], 'record:band') ? (
        <BandForm walk={walk} isAnother={band !== null} />
      ) : (
        !band && <p>Ready for a band. A scrutineer or sign-on puts it on.</p>
      )}
    </section>
  )
}

function BandForm({ walk, isAnother }: { readonly walk: Walk; readonly isAnother: boolean }) {
  const day = useDay()
  const [number, setNumber] = useState('')
  const { busy, problem, act } = useAction()
  const issue = async () => {
    if (!('person' in walk.subject)) return
    const request = { person: walk.subject.person, bandNumber: number.trim().toUpperCase() }
    if (!(await act(() => day.issueBand(request)))) return
    setNumber('')
    forgetWalk(localStorage, subjectKey(walk.subject))
  }
  return (
    <form
      className="grid gap-2"
      onSubmit={(event) => {
        event.preventDefault()
        void issue()
      }}
    >
      <label className="grid gap-1">
        <span>{isAnother ? 'Another band (the old one dies)' : 'Number on the band you put on'}</span>
        <input
          className="figures target-outcome w-full rounded-sm border border-line bg-ground px-4 text-5xl uppercase"
          value={number}
          maxLength={6}
          required
          pattern="[0-9A-Za-z]{1,6}"
          inputMode="numeric"
          autoComplete="off"
          onChange={(event) => setNumber(event.target.value)}
        />
      </label>
      <ProblemNotice problem={problem} />
      <Button type="submit" size="large" look={isAnother ? 'secondary' : 'primary'} isBusy={busy}>
        Band is on
      </Button>
    </form>
  )
}
