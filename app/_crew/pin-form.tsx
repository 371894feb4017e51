'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import type { DevicePerson } from '@/lib/sync/client/day-client'
import { useDay } from './day-context'
import { ProblemNotice } from './problem-notice'
import { useAction } from './use-action'

/** The six digits of one person: set the first time, and set anew by whoever forgot them, since they guard nothing. */
export function PinForm({ person }: { readonly person: DevicePerson }) {
  const day = useDay()
  const [pin, setPin] = useState('')
  const [isForgotten, setForgotten] = useState(false)
  const { busy, problem, act } = useAction()
  const isNew = !person.hasPin || isForgotten

  const submit = async () => {
    const isDone = await act(async () => {
      if (isNew) await day.setPin(person.id, pin)
      await day.unlock(person.id, pin)
    })
    if (!isDone) setPin('')
  }

  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault()
        void submit()
      }}
    >
      <p>
        <span className="font-bold">{person.name}</span>, {person.roles.join(', ')}
      </p>
      <TextField
        label={isNew ? 'Choose six digits for this device' : 'Your six digits'}
        description={isNew ? 'They say who holds it; a reload keeps it unlocked for up to four hours.' : undefined}
        value={pin}
        onChange={(event) => setPin(event.target.value.replace(/\D/g, '').slice(0, 6))}
        inputMode="numeric"
        autoComplete="off"
        pattern="[0-9]{6}"
        required
        name="pin"
      />
      <ProblemNotice problem={problem} />
      <Button type="submit" size="large" isBusy={busy} disabled={pin.length !== 6}>
        {isNew ? 'Set them and go on' : 'Unlock'}
      </Button>
      {!isNew && (
        <Button look="quiet" className="justify-self-start" onClick={() => setForgotten(true)}>
          Set new digits
        </Button>
      )}
    </form>
  )
}
