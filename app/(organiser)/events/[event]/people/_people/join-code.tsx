'use client'

import { useState } from 'react'
import { QrCode } from '@/app/_crew/qr-code'
import { Button } from '@/app/_ui/button'
import { SelectField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import type { AnswerOf } from '@/lib/contracts/contract'
import { JOIN_CODE_MINUTES, JOIN_ROLES, makeJoinCode } from '@/lib/contracts/join'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'
import { useMinutesLeft } from './use-minutes-left'

type Made = AnswerOf<typeof makeJoinCode>

/** Shows a code that lets people ask to join in one role, for a quarter of an hour. */
export function JoinCode({ eventId }: { readonly eventId: string }) {
  const [role, setRole] = useState<(typeof JOIN_ROLES)[number]>('scrutineer')
  const [made, setMade] = useState<Made | null>(null)
  const [problem, setProblem] = useState<Problem | null>(null)
  const [busy, setBusy] = useState(false)

  async function make(): Promise<void> {
    setBusy(true)
    const answer = await call(makeJoinCode, { params: { event: eventId }, body: { role } })
    setBusy(false)
    setProblem(answer.ok ? null : answer.problem)
    if (answer.ok) setMade(answer.value)
  }

  return (
    <section aria-labelledby="join-code" className="grid content-start gap-4 border-2 p-4">
      <h2 id="join-code" className="text-2xl">
        Join code
      </h2>
      <SelectField label="For the role" value={role} onChange={({ target }) => setRole(target.value as typeof role)}>
        {JOIN_ROLES.map((each) => (
          <option key={each} value={each}>
            {each}
          </option>
        ))}
      </SelectField>
      <Button isBusy={busy} onClick={() => void make()}>
        {made === null ? 'Make a join code' : 'Make a new one'}
      </Button>
      {problem && <Notice happened={problem.what} kept={problem.kept} todo={problem.todo} />}
      {made === null ? (
        <p className="text-muted">
          It holds for {JOIN_CODE_MINUTES} minutes and several people may scan it. Each of them then waits here until you accept them by
          name. Chief and organiser need an account.
        </p>
      ) : (
        <ShownCode key={made.token} made={made} />
      )}
    </section>
  )
}

function ShownCode({ made }: { readonly made: Made }) {
  const minutes = useMinutesLeft(made.expiresAt)
  if (minutes === 0) return <Notice weight="news" happened={`The code for ${made.role} has run out.`} todo="Make a new one." />
  return (
    <div className="grid gap-2">
      <QrCode text={made.url} label={`Code to join as ${made.role}`} className="w-full max-w-80 border-2" />
      <p className="font-bold">
        Joins as {made.role}, {minutes === 1 ? 'under a minute left' : `${minutes} minutes left`}
      </p>
      <p className="serial break-all">{made.url}</p>
    </div>
  )
}
