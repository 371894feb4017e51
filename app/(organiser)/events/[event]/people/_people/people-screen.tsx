'use client'

import { useState } from 'react'
import { EmptyState } from '@/app/_ui/empty-state'
import { Notice } from '@/app/_ui/notice'
import type { CrewMemberView } from '@/lib/contracts/crew'
import type { Problem } from '@/lib/contracts/problem'
import { CrewTable } from './crew-table'
import { InviteForm } from './invite-form'
import { JoinCode } from './join-code'
import { type Decision, useCrew } from './use-crew'
import { WaitingList } from './waiting-list'

interface PeopleScreenProps {
  readonly eventId: string
  readonly timeZone: string
  readonly mayInvite: boolean
  readonly mayDecide: boolean
}

/** The event's crew: a code to join by, who waits, who is in. */
export function PeopleScreen({ eventId, timeZone, mayInvite, mayDecide }: PeopleScreenProps) {
  const { crew, problem, decide, renew } = useCrew(eventId)
  const [refused, setRefused] = useState<Problem | null>(null)
  const [said, setSaid] = useState('')
  const waiting = crew?.filter(({ state }) => state === 'waiting') ?? []
  const others = crew?.filter(({ state }) => state !== 'waiting') ?? []

  async function onDecide(member: CrewMemberView, decision: Decision): Promise<void> {
    const failed = await decide(member.id, decision)
    setRefused(failed)
    setSaid(failed ? '' : `${member.name}: ${{ accept: 'accepted', refuse: 'refused', end: 'role ended' }[decision]}`)
  }

  return (
    <div className="grid gap-8 lg:grid-cols-[minmax(0,1fr)_360px] lg:grid-rows-[auto_1fr]">
      <div className="grid content-start gap-6">
        <p role="status" className="sr-only">
          {said}
        </p>
        {problem && (
          <Notice
            happened={problem.what}
            kept="What you see is as it was before."
            todo={`${problem.todo} The list is asked for again by itself.`}
          />
        )}
        {refused && <Notice happened={refused.what} kept={refused.kept} todo={refused.todo} />}
        {crew === null ? (
          <p>{problem ? 'The list is not here yet.' : 'Asking for the list …'}</p>
        ) : (
          <WaitingList waiting={waiting} timeZone={timeZone} mayDecide={mayDecide} onDecide={onDecide} />
        )}
      </div>
      {mayInvite && (
        <div className="grid content-start gap-6 lg:col-start-2 lg:row-span-2 lg:row-start-1">
          <JoinCode eventId={eventId} />
          {mayDecide && <InviteForm eventId={eventId} onInvited={renew} />}
        </div>
      )}
      {crew !== null && (
        <div className="min-w-0">
          {others.length === 0 ? (
            <EmptyState title="Nobody is crew yet">Make a join code, let the crew scan it, and accept each of them by name.</EmptyState>
          ) : (
            <CrewTable crew={others} mayDecide={mayDecide} onDecide={onDecide} />
          )}
        </div>
      )}
    </div>
  )
}
