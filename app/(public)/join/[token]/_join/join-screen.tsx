'use client'

import useSWR from 'swr'
import { Notice } from '@/app/_ui/notice'
import type { AnswerOf } from '@/lib/contracts/contract'
import { seeJoinCode } from '@/lib/contracts/join'
import { callOrThrow, CallProblem } from '@/lib/http/call'
import { JoinForm } from './join-form'
import { JoinWait } from './join-wait'
import { useKeptClaim } from './use-kept-claim'

/** What a join code is for, the name to join under, and then the waiting for the organiser. */
export function JoinScreen({ token }: { readonly token: string }) {
  const claim = useKeptClaim(token)
  const { data, error, mutate } = useSWR<AnswerOf<typeof seeJoinCode>, unknown>(
    // Who has asked already only waits: that the code has run out since is no matter.
    claim.kept === null ? ['join-code', token] : null,
    () => callOrThrow(seeJoinCode, { params: { token } }),
    { shouldRetryOnError: false, revalidateOnFocus: false },
  )
  if (claim.kept === undefined) return <p>One moment …</p>
  if (claim.kept !== null) return <JoinWait kept={claim.kept} onGone={claim.forget} />
  if (error instanceof CallProblem) {
    const { what, kept, todo, code } = error.problem
    if (code === 'missing')
      return <Notice happened="This join code is not known." todo="Scan the code on the screen of the organiser again." />
    return <Notice happened={what} kept={code === 'no-network' ? undefined : kept} todo={todo} />
  }
  if (data === undefined) return <p role="status">Looking up the code …</p>
  return <JoinForm token={token} code={data} onAsked={claim.keep} onCodeGone={() => void mutate()} />
}
