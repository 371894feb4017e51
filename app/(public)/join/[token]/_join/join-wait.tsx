'use client'

import useSWR from 'swr'
import type { KeptClaim } from '@/app/_crew/read-claims'
import { Button, buttonClass } from '@/app/_ui/button'
import { HardLink } from '@/app/_ui/hard-link'
import { Notice } from '@/app/_ui/notice'
import type { AnswerOf } from '@/lib/contracts/contract'
import { joinState } from '@/lib/contracts/join'
import { callOrThrow, CallProblem } from '@/lib/http/call'

const POLL_MS = 3_000

interface JoinWaitProps {
  readonly kept: KeptClaim
  /** The request is gone or was refused: begin anew. */
  readonly onGone: () => void
}

/** Waits for the organiser's word, then leads to the screen of the role. */
export function JoinWait({ kept, onGone }: JoinWaitProps) {
  const { data, error } = useSWR<AnswerOf<typeof joinState>, unknown>(
    ['join-state', kept.claim],
    () => callOrThrow(joinState, { body: { claim: kept.claim } }),
    {
      refreshInterval: (latest) => (latest && latest.state !== 'waiting' ? 0 : POLL_MS),
      refreshWhenOffline: true,
      shouldRetryOnError: false,
    },
  )
  const again = (
    <Button look="secondary" onClick={onGone}>
      Ask again
    </Button>
  )
  if (error instanceof CallProblem && error.problem.code === 'claim-unknown')
    return <Notice happened={error.problem.what} kept={error.problem.kept} todo={error.problem.todo} actions={again} />
  if (data?.state === 'refused')
    return (
      <Notice
        happened={`The organiser did not accept ${kept.name}.`}
        todo="Speak to the organiser; they can show a new code."
        actions={again}
      />
    )
  if (data?.state === 'ended')
    return (
      <Notice
        happened="Your role at this event has ended."
        kept="What you recorded stands."
        todo="Speak to the organiser if that is a mistake."
      />
    )
  if (data?.state === 'accepted') return <Accepted kept={kept} />
  return (
    <div className="grid gap-3">
      <p role="status" className="text-xl font-bold">
        {kept.name} is waiting to be accepted as {kept.role}
      </p>
      <p>The organiser sees your name on the people page of {kept.title}. This page goes on by itself.</p>
      {error instanceof CallProblem && (
        <p className="border-l-8 bg-surface p-4">{error.problem.what} Your request is kept; it is asked again every few seconds.</p>
      )}
    </div>
  )
}

/** Where each role's screens are; every other role works in the bay. */
const POSTS = {
  marshal: { href: '/pit-exit', words: 'To the pit exit' },
  'sign-on': { href: '/sign-on', words: 'To the sign-on desk' },
  bay: { href: '/bay', words: 'To the bay' },
} as const

function Accepted({ kept }: { readonly kept: KeptClaim }) {
  const post = kept.role === 'marshal' || kept.role === 'sign-on' ? POSTS[kept.role] : POSTS.bay
  return (
    <div className="grid gap-4">
      <p role="status" className="text-xl font-bold">
        {kept.name} is accepted as {kept.role}
      </p>
      <p>Next this device is enrolled in your name and the day is loaded on it, while there is signal.</p>
      <HardLink className={buttonClass('primary', 'large')} href={post.href}>
        {post.words}
      </HardLink>
    </div>
  )
}
