'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import type { Problem } from '@/lib/contracts/problem'
import { browserStores } from '@/lib/sync/client/browser-stores'
import { enrolHere } from '@/lib/sync/client/enrol-here'
import { storageError } from '@/lib/sync/client/problem-of'
import type { Chance } from './find-chances'
import { ProblemNotice } from './problem-notice'
import { useAction } from './use-action'

/** Makes this browser a crew device of the event chosen, under the name given. */
export function EnrolForm({ chances }: { readonly chances: readonly Chance[] }) {
  const [chosen, setChosen] = useState(0)
  const [name, setName] = useState('')
  const [refused, setRefused] = useState<Problem | null>(null)
  const { busy, problem, act } = useAction()
  const enrol = async () => {
    const chance = chances[chosen]
    if (!chance) return
    const request = { event: chance.event, name: name.trim(), ...(chance.claim === null ? {} : { claim: chance.claim }) }
    setRefused(null)
    await act(async () => {
      const outcome = await enrolHere(request, browserStores, Date.now()).catch((error: unknown) => {
        throw storageError(error)
      })
      // A fresh page opens the device's own store from the start.
      if (outcome.ok) window.location.reload()
      else setRefused(outcome.problem)
    })
  }
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault()
        void enrol()
      }}
    >
      <ChancePicker chances={chances} chosen={chosen} onPick={setChosen} />
      <TextField
        label="Name of this device"
        description="As the organiser sees it, such as “tablet, lane 2”."
        name="name"
        value={name}
        onChange={(event) => setName(event.target.value)}
        maxLength={60}
        required
      />
      {refused && <Notice happened={refused.what} kept={refused.kept} todo={refused.todo} />}
      <ProblemNotice problem={problem} />
      <Button type="submit" size="large" isBusy={busy}>
        Enrol this device
      </Button>
    </form>
  )
}

interface ChancePickerProps {
  readonly chances: readonly Chance[]
  readonly chosen: number
  readonly onPick: (index: number) => void
}

function ChancePicker({ chances, chosen, onPick }: ChancePickerProps) {
  return (
    <fieldset className="grid gap-2">
      <legend className="font-bold">For which event</legend>
      {chances.map((chance, index) => (
        <label key={`${chance.event} ${chance.claim ?? ''}`} className="target flex items-center gap-3 border-t border-line py-2">
          <input type="radio" name="chance" className="choice-mark" checked={index === chosen} onChange={() => onPick(index)} />
          <span>
            {chance.title}
            <span className="block text-muted">{chance.as}</span>
          </span>
        </label>
      ))}
    </fieldset>
  )
}
