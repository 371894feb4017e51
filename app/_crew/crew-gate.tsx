'use client'

import { useState, type ReactNode } from 'react'
import { Notice } from '@/app/_ui/notice'
import { Button } from '@/app/_ui/button'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { useDayHere } from '@/lib/sync/client/use-day-here'
import type { DayClient } from '@/lib/sync/client/day-client'
import { DayProvider } from './day-context'
import { EnrolScreen } from './enrol-screen'
import { LoadScreen } from './load-screen'
import { StatusStrip } from './status-strip'
import { UnlockScreen } from './unlock-screen'

interface CrewGateProps {
  readonly post: 'bay' | 'pit-exit'
  readonly children: ReactNode
}

/** What stands before every crew screen: this device is enrolled, the day is loaded, somebody is unlocked. None of it needs the network once done. */
export function CrewGate({ post, children }: CrewGateProps) {
  const here = useDayHere()
  if (here.state === 'opening') return <p className="p-6">Opening what this device holds …</p>
  if (here.state === 'not-enrolled') return <EnrolScreen post={post} />
  if (here.state === 'failed')
    return (
      <Notice
        happened={here.problem.what}
        kept={here.problem.kept}
        todo={here.problem.todo}
        actions={<Button onClick={() => window.location.reload()}>Try again</Button>}
        className="m-4"
      />
    )
  return (
    <DayProvider client={here.client}>
      <Opened client={here.client}>{children}</Opened>
    </DayProvider>
  )
}

function Opened({ client, children }: { readonly client: DayClient; readonly children: ReactNode }) {
  const status = useDayStatus(client)
  // A day loaded before needs no new word of confirmation: a reload must not stand between a glove and its check.
  const [isReady, setReady] = useState(status.loaded)
  return (
    // A tap anywhere says that somebody is still there.
    <div className="mx-auto flex min-h-dvh w-full max-w-3xl flex-col" onPointerDown={client.touched}>
      <StatusStrip />
      {status.unlocked === null ? <UnlockScreen /> : isReady ? children : <LoadScreen onReady={() => setReady(true)} />}
    </div>
  )
}
