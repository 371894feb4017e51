'use client'

import { useState } from 'react'
import useSWR from 'swr'
import { EmptyState } from '@/app/_ui/empty-state'
import { Notice } from '@/app/_ui/notice'
import { type DeviceView, listDevices } from '@/lib/contracts/devices'
import { callOrThrow, CallProblem } from '@/lib/http/call'
import { DevicesTable } from './devices-table'
import { type OutOfUse, TakeOutDialog } from './take-out-dialog'

const POLL_MS = 15_000

interface DevicesScreenProps {
  readonly eventId: string
  readonly timeZone: string
  readonly mayRetire: boolean
}

/** Every device that signs for this event, and how to take one out of use. */
export function DevicesScreen({ eventId, timeZone, mayRetire }: DevicesScreenProps) {
  const { data, error, mutate } = useSWR<{ devices: DeviceView[] }, unknown>(
    ['devices', eventId],
    () => callOrThrow(listDevices, { params: { event: eventId } }),
    { refreshInterval: POLL_MS, refreshWhenOffline: true, shouldRetryOnError: false },
  )
  const [asked, setAsked] = useState<OutOfUse | null>(null)
  const [said, setSaid] = useState('')
  const problem = error instanceof CallProblem ? error.problem : null

  async function onDone({ device, as }: OutOfUse): Promise<void> {
    setSaid(`Device ${device.kid}, ${device.name}: ${as}`)
    setAsked(null)
    await mutate()
  }

  return (
    <div className="grid gap-6">
      <p role="status" className="sr-only">
        {said}
      </p>
      {problem && (
        <Notice
          happened={problem.what}
          kept="What you see is as it was before."
          todo={`${problem.todo} The list is asked for again by itself.`}
        />
      )}
      {data === undefined ? (
        <p>{problem ? 'The list is not here yet.' : 'Asking for the list …'}</p>
      ) : data.devices.length === 0 ? (
        <EmptyState title="No device is enrolled yet">
          A phone or tablet is enrolled when somebody of the crew opens the bay or the pit exit on it and puts it to their name.
        </EmptyState>
      ) : (
        <DevicesTable devices={data.devices} timeZone={timeZone} mayRetire={mayRetire} onTakeOut={setAsked} />
      )}
      {asked && <TakeOutDialog key={asked.device.id} eventId={eventId} asked={asked} onClose={() => setAsked(null)} onDone={onDone} />}
    </div>
  )
}
