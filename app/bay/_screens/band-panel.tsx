'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'
import type { Walk } from './use-walk'

/** The wristband of a person whose helmet and kit have passed: its printed number is keyed in, and the band lives from then on. */
export function BandPanel({ walk }: { readonly walk: Walk }) {
  const day = useDay()
  const { unlocked } = useDayStatus(day)
  const [number, setNumber] = useState('')
  const { busy, problem, act } = useAction()
  const person = 'person' in walk.subject ? walk.subject.person : null
  if (person === null) return null
  const band = walk.state.passes.findLast(
    ({ state, record }) => state === 'live' && record.kind === 'band' && record.day === day.status().day,
  )

  const issue = async () => {
    await act(async () => {
      await day.issueBand({ person, bandNumber: number.trim().toUpperCase() })
      setNumber('')
    })
  }

  if (!can(unlocked?.roles ?? [], 'record:band')) return <p>Ready for a band. A scrutineer or sign-on puts it on.</p>
  return (
    <section className="grid gap-3" aria-label="Band">
      {band?.record.kind === 'band' && (
        <p className="flex items-center gap-3 text-xl font-bold">
          <OutcomeShape state="ok" className="size-8" /> Band {band.record.bandNumber}
        </p>
      )}
      <ProblemNotice problem={problem} />
      <form
        className="grid gap-2"
        onSubmit={(event) => {
          event.preventDefault()
          void issue()
        }}
      >
        <label className="grid gap-1">
          <span>{band ? 'Another band (the old one dies)' : 'Number on the band you put on'}</span>
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
        <Button type="submit" size="large" look={band ? 'secondary' : 'primary'} isBusy={busy}>
          Band is on
        </Button>
      </form>
    </section>
  )
}
