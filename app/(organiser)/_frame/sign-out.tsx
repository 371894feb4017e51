'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { signOut } from '@/lib/contracts/sign-out'
import { call } from '@/lib/http/call'

/** Ends this sign-in. An enrolled device goes on recording: its own key does that. */
export function SignOut() {
  const [busy, setBusy] = useState(false)
  const [failed, setFailed] = useState<string | null>(null)

  async function end(): Promise<void> {
    setBusy(true)
    const ended = await call(signOut, { body: {} })
    // Somebody whose sign-in was over already is out all the same.
    if (ended.ok || ended.problem.code === 'not-signed-in') {
      // eslint-disable-next-line @next/next/no-location-assign-relative-destination -- a whole page: nothing of this person may stay in memory
      window.location.assign('/sign-in')
      return
    }
    setFailed(`Still signed in: ${ended.problem.what} ${ended.problem.todo}`)
    setBusy(false)
  }

  return (
    <>
      <Button look="secondary" isBusy={busy} onClick={() => void end()}>
        Sign out
      </Button>
      {failed !== null && (
        <p role="alert" className="basis-full">
          {failed}
        </p>
      )}
    </>
  )
}
