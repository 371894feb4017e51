'use client'

import { lazy, Suspense, useState, type ReactNode } from 'react'
import { Notice } from '@/app/_ui/notice'
import { Button } from '@/app/_ui/button'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { useDayHere } from '@/lib/sync/client/use-day-here'
import type { DayClient } from '@/lib/sync/client/day-client'
import { DayProvider } from './day-context'
import { LoadScreen } from './load-screen'
import { MachineProblem } from './machine-problem'
import { StatusStrip } from './status-strip'
import { UnlockScreen } from './unlock-screen'

// Needed once in a device's life, and only with the network: no crew screen waits for it.
const EnrolScreen = lazy(() => import('./enrol-screen').then((module) => ({ default: module.EnrolScreen })))

interface CrewGateProps {
  readonly post: 'bay' | 'pit-exit' | 'sign-on'
  readonly children: ReactNode
}

/** What stands before every crew screen: this device is enrolled, the day is loaded, somebody is unlocked. None of it needs the network once done. */
export function CrewGate({ post, children }: CrewGateProps) {
  const here = useDayHere()
  if (here.state === 'opening') return <Opening />
  if (here.state === 'not-enrolled')
    return (
      <Suspense fallback={<Opening />}>
        <EnrolScreen post={post} />
      </Suspense>
    )
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
      <OpenedDay client={here.client}>{children}</OpenedDay>
    </DayProvider>
  )
}

function Opening() {
  return (
    <p role="status" className="p-6">
      Opening what this device holds …
    </p>
  )
}

/** The day is open: its strip, and below it whichever comes first of unlocking, loading and the screen itself. */
function OpenedDay({ client, children }: { readonly client: DayClient; readonly children: ReactNode }) {
  const status = useDayStatus(client)
  // A day loaded before needs no new word of confirmation: a reload must not stand between a glove and its check.
  const [isReady, setReady] = useState(status.loaded)
  return (
    // A tap anywhere says that somebody is still there.
    <div className="mx-auto flex min-h-dvh w-full max-w-3xl flex-col" onPointerDown={client.touched} onKeyDown={client.touched}>
      <StatusStrip />
      <MachineProblem />
      {status.unlocked === null ? <UnlockScreen /> : isReady ? children : <LoadScreen onReady={() => setReady(true)} />}
    </div>
  )
}
