'use client'

import Link from 'next/link'
import { useState } from 'react'
import { daysInWords } from '@/app/(organiser)/_frame/event-frame'
import { Button, buttonClass } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { NumberPlate } from '@/app/_ui/number-plate'
import { openEntryLink } from '@/lib/contracts/entry-link'
import type { Problem } from '@/lib/contracts/problem'
import type { LinkShown } from '@/lib/entrants/queries/find-entry-link'
import { call } from '@/lib/http/call'
import { ERRORS } from '@/lib/http/errors'

interface LinkScreenProps {
  readonly token: string
  readonly shown: LinkShown
}

const SIGN_IN = (
  <Link className={buttonClass('secondary')} href="/sign-in?next=/cars">
    Sign in with a password
  </Link>
)

/** What the link is for, and one button that goes on with it. */
export function LinkScreen({ token, shown }: LinkScreenProps) {
  const [problem, setProblem] = useState<Problem | null>(null)
  const [busy, setBusy] = useState(false)
  if (shown.is === 'over') {
    const { what, kept, todo } = ERRORS['entry-link-over']
    return <Notice happened={what} kept={kept} todo={todo} actions={SIGN_IN} />
  }
  const goOn = async () => {
    setBusy(true)
    const opened = await call(openEntryLink, { params: { token }, body: {} })
    if (opened.ok) {
      // eslint-disable-next-line @next/next/no-location-assign-relative-destination -- a whole page: nothing rendered for somebody else may stay in memory
      window.location.assign(`/entries/${opened.value.entry}`)
      return
    }
    setProblem(opened.problem)
    setBusy(false)
  }
  const { event, number, model, name, somebodyElse } = shown
  return (
    <div className="grid gap-6">
      <div>
        <p className="heading text-2xl">{event.name}</p>
        <p>
          {event.venue}, {daysInWords(event)}
        </p>
      </div>
      <div className="flex flex-wrap items-end gap-4">
        <NumberPlate number={number} />
        <p>
          <strong className="text-lg">{model}</strong>
          <span className="block">for {name}</span>
        </p>
      </div>
      <p className="max-w-prose">
        Go on to declare the car and your kit, to see what would not be passed, and on the day how it stands. This link is yours alone:
        whoever has it can declare in your name.
      </p>
      {somebodyElse !== null && (
        <Notice
          weight="news"
          happened={`${somebodyElse} is signed in on this browser.`}
          todo={`Going on signs ${somebodyElse} out here and ${name} in. If you are not ${name}, leave this page.`}
        />
      )}
      {problem && (
        <Notice
          happened={problem.what}
          kept={problem.kept}
          todo={problem.todo}
          actions={
            problem.code === 'entry-link-needs-password' ? (
              <Link className={buttonClass('secondary')} href={`/sign-in?next=${encodeURIComponent(`/entry/${token}`)}`}>
                Sign in with a password
              </Link>
            ) : undefined
          }
        />
      )}
      <Button size="large" isBusy={busy} onClick={() => void goOn()}>
        Go on
      </Button>
    </div>
  )
}
