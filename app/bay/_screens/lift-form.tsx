'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import type { WalkSubject } from './use-walk'

/** The chief lifts holds without a new look, and says why. What was written stays until it is saved. */
export function LiftForm({ subject, holds }: { readonly subject: WalkSubject; readonly holds: readonly string[] }) {
  const day = useDay()
  const [why, setWhy] = useState('')
  const { busy, problem, act } = useAction()
  const lift = async () => {
    if (await act(() => day.record([{ kind: 'lifted', subject, holds, why: why.trim() }]))) setWhy('')
  }
  return (
    <form
      className="mt-4 grid gap-2"
      onSubmit={(event) => {
        event.preventDefault()
        void lift()
      }}
    >
      <TextField
        label="Lift it without a new look, because"
        value={why}
        maxLength={500}
        minLength={3}
        required
        onChange={(event) => setWhy(event.target.value)}
      />
      <ProblemNotice problem={problem} />
      <Button type="submit" look="secondary" isBusy={busy}>
        Lift the hold
      </Button>
    </form>
  )
}
