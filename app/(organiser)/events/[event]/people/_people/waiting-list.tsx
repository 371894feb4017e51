'use client'

import { useState } from 'react'
import { clockTime } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import type { CrewMemberView } from '@/lib/contracts/crew'
import type { Decision } from './use-crew'

interface WaitingListProps {
  readonly waiting: readonly CrewMemberView[]
  readonly timeZone: string
  readonly mayDecide: boolean
  readonly onDecide: (member: CrewMemberView, decision: Decision) => Promise<void>
}

/** Who has scanned a code and waits; longest wait on top. Nobody records anything before being accepted. */
export function WaitingList({ waiting, timeZone, mayDecide, onDecide }: WaitingListProps) {
  const [busy, setBusy] = useState<string | null>(null)

  async function decide(member: CrewMemberView, decision: Decision): Promise<void> {
    setBusy(member.id)
    await onDecide(member, decision)
    setBusy(null)
  }

  return (
    <section aria-labelledby="waiting">
      <h2 id="waiting" className="border-b-[3px] pb-1 text-2xl">
        {waiting.length === 0 ? 'Nobody waits' : `${waiting.length} waiting`}
      </h2>
      {waiting.length === 0 && <p className="py-3 text-muted">Who scans a join code appears here by name.</p>}
      <ul>
        {waiting.map((member) => (
          <li key={member.id} className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b py-3">
            <p>
              <span className="block text-xl font-bold">{member.name}</span>
              asks to be {member.role}, since {clockTime(member.askedAt, timeZone)}
            </p>
            {mayDecide && (
              <div className="flex gap-12">
                <Button
                  look="secondary"
                  isBusy={busy === member.id}
                  aria-label={`Refuse ${member.name}`}
                  onClick={() => void decide(member, 'refuse')}
                >
                  Refuse
                </Button>
                <Button isBusy={busy === member.id} aria-label={`Accept ${member.name}`} onClick={() => void decide(member, 'accept')}>
                  Accept
                </Button>
              </div>
            )}
          </li>
        ))}
      </ul>
    </section>
  )
}
