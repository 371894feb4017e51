'use client'

import { lazy, Suspense, useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { entryOfScan } from './entry-of-scan'

// The scanner is heavy, and most cars are found by their number.
const CameraView = lazy(() => import('@/app/pit-exit/_screens/camera-view').then((module) => ({ default: module.CameraView })))

/** Finds a car by the entry code on its driver's phone, or by its sticker. What is read only looks up a car; it is never opened. */
export function ScanToFind() {
  const day = useDay()
  const [isOpen, setOpen] = useState(false)
  const [isUnknown, setUnknown] = useState(false)
  const take = (text: string) => {
    const entry = entryOfScan(text, day.snapshot(), day.passList())
    if (entry === null) setUnknown(true)
    else goTo(`/bay/car/${entry}`)
  }
  if (!isOpen)
    return (
      <Button look="secondary" className="self-start" onClick={() => setOpen(true)}>
        Scan a code
      </Button>
    )
  return (
    <div className="grid gap-2">
      <Suspense fallback={<p>Opening the camera …</p>}>
        <CameraView onText={take} />
      </Suspense>
      <p role="status" className="font-bold">
        {isUnknown ? 'That code names no car loaded here. Type the number instead.' : ''}
      </p>
      <Button
        look="quiet"
        className="justify-self-start"
        onClick={() => {
          setOpen(false)
          setUnknown(false)
        }}
      >
        Close the camera
      </Button>
    </div>
  )
}
