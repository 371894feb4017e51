'use client'

import { type SubmitEvent, useState } from 'react'
import { Button } from '@/app/_ui/button'
import { Dialog } from '@/app/_ui/dialog'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { type DeviceView, retireDevice } from '@/lib/contracts/devices'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'

/** A device that somebody is about to take out of use. */
export interface OutOfUse {
  readonly device: DeviceView
  readonly as: 'retired' | 'lost'
}

interface TakeOutDialogProps {
  readonly eventId: string
  readonly asked: OutOfUse
  readonly onClose: () => void
  readonly onDone: (asked: OutOfUse) => Promise<void>
}

const WORDS = {
  retired: {
    title: 'Retire',
    button: 'Retire it for good',
    means:
      'What it recorded until now stands, its passes too. Later records of it that permit something no longer count; a stop still does.',
  },
  lost: {
    title: 'Report lost:',
    button: 'Report it lost for good',
    means:
      'What it sent until now stands. A pass it issued and did not send is CHECK at the pit exit, and later permissions wait for the chief. A stop still counts.',
  },
} as const

/** Takes a device out of use once its number has been typed: nothing makes it active again. */
export function TakeOutDialog({ eventId, asked, onClose, onDone }: TakeOutDialogProps) {
  const { device, as } = asked
  const [typed, setTyped] = useState('')
  const [error, setError] = useState<string | undefined>(undefined)
  const [problem, setProblem] = useState<Problem | null>(null)
  const [busy, setBusy] = useState(false)

  async function send(event: SubmitEvent): Promise<void> {
    event.preventDefault()
    const isRight = typed.trim() === String(device.kid)
    setError(isRight ? undefined : `Type ${device.kid}, the number of this device.`)
    if (!isRight) return
    setBusy(true)
    const done = await call(retireDevice, { params: { event: eventId }, body: { device: device.id, as } })
    setBusy(false)
    if (done.ok) await onDone(asked)
    else setProblem(done.problem)
  }

  return (
    <Dialog isOpen onClose={onClose} title={`${WORDS[as].title} ${device.name}`}>
      <form className="grid gap-4" onSubmit={(event) => void send(event)} noValidate>
        <p>{WORDS[as].means}</p>
        {device.unsent !== null && device.unsent > 0 && (
          <p className="font-bold">When last heard it still held {device.unsent} unsent. If it is at hand, let it send first.</p>
        )}
        <p>This cannot be undone. Whoever used it goes on with another device.</p>
        <TextField
          label={`Type ${device.kid}, the number of the device`}
          inputMode="numeric"
          autoComplete="off"
          value={typed}
          error={error}
          onChange={({ target }) => setTyped(target.value)}
        />
        {problem && <Notice happened={problem.what} kept={problem.kept} todo={problem.todo} />}
        <div className="flex flex-wrap justify-end gap-3">
          <Button look="secondary" onClick={onClose}>
            Leave it
          </Button>
          <Button type="submit" isBusy={busy}>
            {WORDS[as].button}
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
