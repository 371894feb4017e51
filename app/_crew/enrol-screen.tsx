'use client'

import { useEffect, useState } from 'react'
import { buttonClass } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { EnrolForm } from './enrol-form'
import { findChances, type Chance } from './find-chances'

const TITLES = { bay: 'A device for the bay', 'pit-exit': 'A device for the pit exit', 'sign-on': 'A device for sign-on' } as const

/** Makes this browser a crew device: its key is made here and never leaves it. Needs the network once. */
export function EnrolScreen({ post }: { readonly post: keyof typeof TITLES }) {
  const [chances, setChances] = useState<readonly Chance[] | null>(null)
  useEffect(() => {
    let cancelled = false
    void findChances().then((found) => !cancelled && setChances(found))
    return () => {
      cancelled = true
    }
  }, [])
  if (chances === null)
    return (
      <p role="status" className="p-6">
        Looking for what this device may be …
      </p>
    )
  return (
    <main className="mx-auto grid w-full max-w-3xl gap-4 p-4">
      <h1 className="text-xl">{TITLES[post]}</h1>
      {chances.length > 0 ? (
        <EnrolForm chances={chances} />
      ) : (
        <EmptyState
          title="This device is not enrolled yet"
          actions={
            <a className={buttonClass('primary')} href={`/sign-in?next=/${post}`}>
              Sign in
            </a>
          }
        >
          Sign in here if you have an account and are crew of an event, or open the join link the organiser shows you. It needs the network
          this once.
        </EmptyState>
      )}
    </main>
  )
}
