'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { dayProblemOf, type DayProblem } from '@/lib/sync/client/day-problem'
import type { DevicePerson } from '@/lib/sync/client/day-client'
import { useDayVersion } from '@/lib/sync/client/use-day'
import { Notice } from '@/app/_ui/notice'
import { useDay } from './day-context'

/** Who holds this device now: six digits that say so. They are for attribution and protect nothing. */
export function UnlockScreen() {
  const day = useDay()
  useDayVersion(day)
  const people = day.people()
  const [chosen, setChosen] = useState<string | null>(people.length === 1 ? (people[0]?.id ?? null) : null)
  const person = people.find(({ id }) => id === chosen) ?? null
  return (
    <main className="grid gap-4 p-4">
      <h1 className="text-xl">Who holds this device?</h1>
      {people.length > 1 && (
        <div className="grid gap-2">
          {people.map((one) => (
            <Button key={one.id} look={one.id === chosen ? 'primary' : 'secondary'} onClick={() => setChosen(one.id)}>
              {one.name}, {one.roles.join(', ')}
            </Button>
          ))}
        </div>
      )}
      {person && <PinForm key={person.id} person={person} />}
    </main>
  )
}

function PinForm({ person }: { readonly person: DevicePerson }) {
  const day = useDay()
  const [pin, setPin] = useState('')
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState<DayProblem | null>(null)
  const isNew = !person.hasPin

  const submit = async () => {
    setBusy(true)
    try {
      if (isNew) await day.setPin(person.id, pin)
      await day.unlock(person.id, pin)
    } catch (error) {
      const known = dayProblemOf(error)
      if (!known) throw error
      setProblem(known)
      setPin('')
    } finally {
      setBusy(false)
    }
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
      {problem && <Notice happened={problem.what} kept={problem.kept} todo={problem.todo} />}
      <Button type="submit" size="large" isBusy={busy} disabled={pin.length !== 6}>
        {isNew ? 'Set them and go on' : 'Unlock'}
      </Button>
    </form>
  )
}
