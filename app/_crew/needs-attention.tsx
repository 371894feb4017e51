'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Sheet } from '@/app/_ui/sheet'
import { DISCARD_WORDS, type NeedsAttention as Kept } from '@/lib/sync/client/day-client'
import { useDayVersion } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'
import { ProblemNotice } from './problem-notice'
import { clockTime } from './say-when'
import { useAction } from './use-action'

/** Records the server would not take: they stay on the device until they are sent after all, or a person throws them away by typing it. */
export function NeedsAttention({ onClose }: { readonly onClose: () => void }) {
  const day = useDay()
  useDayVersion(day)
  const kept = day.attention()
  return (
    <Sheet isOpen title="Needs attention" onClose={onClose}>
      {kept.length === 0 && <p>Nothing is left. All that was made here has been sent.</p>}
      <ul className="grid gap-4">
        {kept.map((one) => (
          <KeptRecord key={one.id} kept={one} />
        ))}
      </ul>
      <Button look="secondary" className="mt-4" onClick={onClose}>
        Close
      </Button>
    </Sheet>
  )
}

function KeptRecord({ kept }: { readonly kept: Kept }) {
  const day = useDay()
  const [typed, setTyped] = useState('')
  const { busy, problem, act } = useAction()
  const zone = day.snapshot()?.event.timeZone ?? 'UTC'
  const number = kept.subject.startsWith('car:') ? day.entry(kept.subject.slice('car:'.length))?.number : undefined
  return (
    <li className="grid gap-2 border-t border-line pt-3">
      <p className="font-bold">
        {kept.kind}
        {number === undefined ? '' : ` of ${number}`}, {clockTime(kept.at, zone)}
      </p>
      <p>{kept.why}</p>
      <Button look="secondary" isBusy={busy} onClick={() => void act(() => day.retry(kept.id))}>
        Send it again
      </Button>
      <form
        className="grid gap-2"
        onSubmit={(event) => {
          event.preventDefault()
          void act(() => day.discard(kept.id, typed))
        }}
      >
        <TextField
          label={`To throw it away for good, type “${DISCARD_WORDS}”`}
          value={typed}
          autoComplete="off"
          autoCapitalize="none"
          onChange={(event) => setTyped(event.target.value)}
        />
        <ProblemNotice problem={problem} />
        <Button type="submit" look="quiet" className="justify-self-start" isBusy={busy}>
          Throw it away
        </Button>
      </form>
    </li>
  )
}
