'use client'

import { useEffect, useEffectEvent, useRef, useState } from 'react'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { startScanner } from '@/lib/scanner/html5-qrcode-scanner'
import type { ScanControls, ScanProblem } from '@/lib/scanner/port'

/** The camera, open as soon as the screen stands. What it reads goes to `onText` and nowhere else; where there is none, why, and a way to try again. */
export function CameraView({ onText }: { readonly onText: (text: string) => void }) {
  const host = useRef<HTMLDivElement>(null)
  const [tries, setTries] = useState(0)
  const [problem, setProblem] = useState<ScanProblem | null>(null)
  const [controls, setControls] = useState<ScanControls | null>(null)
  const [isLit, setLit] = useState(false)
  const take = useEffectEvent(onText)
  useEffect(() => {
    const element = host.current
    if (element === null) return
    const stop = startScanner(element, (text) => take(text), setProblem, setControls)
    return () => void stop()
  }, [tries])

  if (problem)
    return (
      <Notice
        weight="news"
        happened={problem.happened}
        kept={problem.kept}
        todo={problem.todo}
        actions={
          <Button
            look="secondary"
            onClick={() => {
              setProblem(null)
              setTries(tries + 1)
            }}
          >
            Open the camera again
          </Button>
        }
        className="m-4"
      />
    )
  const { setTorch } = controls ?? { setTorch: null }
  return (
    <section aria-label="Camera" className="relative h-[30dvh] min-h-40 overflow-hidden bg-surface">
      {controls === null && <p className="absolute inset-x-4 top-4">Opening the camera …</p>}
      {/* The picture is taller than its window: its middle shows, where codes are looked for. */}
      <div ref={host} className="absolute inset-x-0 top-1/2 -translate-y-1/2" />
      {setTorch && (
        <Button
          look="secondary"
          aria-pressed={isLit}
          className="absolute bottom-2 right-2"
          onClick={() => void setTorch(!isLit).then(() => setLit(!isLit))}
        >
          {isLit ? 'Lamp off' : 'Lamp on'}
        </Button>
      )}
    </section>
  )
}
