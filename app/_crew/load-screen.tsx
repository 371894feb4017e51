'use client'

import { useEffect, useState } from 'react'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { Progress } from '@/app/_ui/progress'
import type { DeviceCheck, LoadProgress } from '@/lib/sync/client/day-client'
import { dayProblemOf, type DayProblem } from '@/lib/sync/client/day-problem'
import { useDay } from './day-context'

/** Loads the day onto this device, with real counts, and says what this device can and cannot do before anybody walks out of the signal. */
export function LoadScreen({ onReady }: { readonly onReady: () => void }) {
  const day = useDay()
  const [progress, setProgress] = useState<LoadProgress | null>(null)
  const [problem, setProblem] = useState<DayProblem | null>(null)
  const [check, setCheck] = useState<DeviceCheck | null>(null)
  const [tries, setTries] = useState(0)
  useEffect(() => {
    let cancelled = false
    day
      .loadDay((now) => !cancelled && setProgress(now))
      .then(
        (done) => !cancelled && setCheck(done),
        (error: unknown) => {
          const known = dayProblemOf(error)
          if (!known) throw error
          if (!cancelled) setProblem(known)
        },
      )
    return () => {
      cancelled = true
    }
  }, [day, tries])
  return (
    <main className="grid gap-4 p-4">
      <h1 className="text-xl">Load the day</h1>
      <p>Entries, checklist, limits and all records of the event come onto this device. Stay where there is signal until it says ready.</p>
      {progress && (
        <Progress label="Entries and records" done={progress.entries + progress.records} total={null} unit={`loaded (${progress.step})`} />
      )}
      {check && <Checked check={check} onReady={onReady} />}
      {problem && (
        <Notice
          happened={problem.what}
          kept={problem.kept}
          todo={problem.todo}
          actions={
            <Button
              onClick={() => {
                setProblem(null)
                setTries(tries + 1)
              }}
            >
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
  return (
    <section className="grid gap-3">
      <h2 className="text-lg">{check.readyOffline ? 'Ready offline' : 'Not ready for offline'}</h2>
      <ul className="grid gap-2">
        {check.problems.map((one) => (
          <li key={one.code}>
            <Notice weight="news" happened={one.what} kept={one.kept} todo={one.todo} />
          </li>
        ))}
      </ul>
      {check.leftBytes !== null && <p className="text-muted">Room on this device: about {Math.round(check.leftBytes / 1_000_000)} MB.</p>}
      <Button size="large" onClick={onReady}>
        {check.readyOffline ? 'Begin' : 'Go on all the same'}
      </Button>
    </section>
  )
}
