'use client'

import { useEffect, useRef, useState } from 'react'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { Progress } from '@/app/_ui/progress'
import type { DeviceCheck, LoadProgress } from '@/lib/sync/client/day-client'
import { useDay } from './day-context'
import { useAction } from './use-action'
import { useKeptOffline } from './use-kept-offline'

const STEPS: Readonly<Record<LoadProgress['step'], string>> = {
  event: 'asking for the event',
  records: 'records',
  checklists: 'checklist and limits',
  device: 'looking at this device',
  done: 'done',
}

/** Loads the day onto this device, with real counts, and says what this device can and cannot do before anybody walks out of the signal. */
export function LoadScreen({ onReady }: { readonly onReady: () => void }) {
  const day = useDay()
  const [progress, setProgress] = useState<LoadProgress | null>(null)
  const [check, setCheck] = useState<DeviceCheck | null>(null)
  const { busy, problem, act } = useAction()
  const begun = useRef(false)
  const load = () => act(async () => setCheck(await day.loadDay(setProgress)))
  useEffect(() => {
    // Once, also where effects are started twice.
    if (begun.current) return
    begun.current = true
    void load()
  })
  return (
    <main className="grid gap-4 p-4">
      <h1 className="text-xl">Load the day</h1>
      <p>Entries, checklist, limits and all records of the event come onto this device. Stay where there is signal until it says ready.</p>
      {progress && (
        <>
          <Progress label="Entries" done={progress.entries} total={null} unit="loaded" />
          <Progress label="Records" done={progress.records} total={progress.of} unit="loaded" />
          <p role="status" className="text-muted">
            Now: {STEPS[progress.step]}
          </p>
        </>
      )}
      {check && <Checked check={check} onReady={onReady} />}
      {problem && (
        <Notice
          happened={problem.what}
          kept={problem.kept}
          todo={problem.todo}
          actions={
            <Button isBusy={busy} onClick={() => void load()}>
              Load again
            </Button>
          }
        />
      )}
    </main>
  )
}

/** What this device can do, worst first, and the way on. */
function Checked({ check, onReady }: { readonly check: DeviceCheck; readonly onReady: () => void }) {
  const kept = useKeptOffline(`/${window.location.pathname.split('/')[1] ?? ''}`)
  if (kept === 'looking') return <p role="status">Keeping these screens for when there is no network …</p>
  const isReady = check.readyOffline && kept === 'yes'
  return (
    <section className="grid gap-3">
      <h2 className="text-lg">{isReady ? 'Ready offline' : 'Not ready for offline'}</h2>
      <ul className="grid gap-2">
        {kept === 'no' && (
          <li>
            <Notice
              weight="news"
              happened="This browser does not keep these screens."
              kept="Records are kept all the same."
              todo="Leave this page open all day, or use another browser: without a network it does not open again."
            />
          </li>
        )}
        {check.problems.map((one) => (
          <li key={one.code}>
            <Notice weight="news" happened={one.what} kept={one.kept} todo={one.todo} />
          </li>
        ))}
      </ul>
      {check.leftBytes !== null && <p className="text-muted">Room on this device: about {Math.round(check.leftBytes / 1_000_000)} MB.</p>}
      <Button size="large" onClick={onReady}>
        {isReady ? 'Begin' : 'Go on all the same'}
      </Button>
    </section>
  )
}
