'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import type { KeptClaim } from '@/app/_crew/read-claims'
import { dayWords } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import type { AnswerOf } from '@/lib/contracts/contract'
import { join, joinBody, type seeJoinCode } from '@/lib/contracts/join'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'

interface JoinFormProps {
  readonly token: string
  readonly code: AnswerOf<typeof seeJoinCode>
  /** Keeps the claim on this phone; throws where the browser keeps nothing. */
  readonly onAsked: (claim: KeptClaim) => void
  readonly onCodeGone: () => void
}

/** The event and the role, and the name under which the crew knows this person. */
export function JoinForm({ token, code: { event, role }, onAsked, onCodeGone }: JoinFormProps) {
  const [problem, setProblem] = useState<Pick<Problem, 'what' | 'kept' | 'todo'> | null>(null)
  const form = useForm({ resolver: zodResolver(joinBody), defaultValues: { name: '' } })
  const { errors, isSubmitting } = form.formState

  const send = form.handleSubmit(async (body) => {
    setProblem(null)
    if (!canKeep()) {
      setProblem(KEEPS_NOTHING)
      return
    }
    const asked = await call(join, { params: { token }, body })
    if (asked.ok) {
      const { claim, role: given, event: at } = asked.value
      onAsked({ claim, event: at.id, role: given, name: body.name, title: `${at.name}, ${dayWords(at.firstDay)}` })
      return
    }
    setProblem(asked.problem)
    if (asked.problem.code === 'join-code-expired') onCodeGone()
  })

  return (
    <form className="grid max-w-md gap-5" onSubmit={(event_) => void send(event_)} noValidate>
      <p>
        <span className="heading block text-2xl">{event.name}</span>
        {event.venue}, {dayWords(event.firstDay)}
        {event.lastDay !== event.firstDay && ` to ${dayWords(event.lastDay)}`}
      </p>
      <p>
        You ask to join as <strong className="text-xl">{role}</strong>. The organiser accepts you by name.
      </p>
      {problem && <Notice happened={problem.what} kept={problem.kept} todo={problem.todo} />}
      <TextField
        label="Your name"
        description="As the crew knows you; it stands beside what you record."
        autoComplete="name"
        error={errors.name?.message}
        {...form.register('name')}
      />
      <div>
        <Button type="submit" isBusy={isSubmitting}>
          Ask to join
        </Button>
      </div>
    </form>
  )
}

const KEEPS_NOTHING = {
  what: 'This browser keeps nothing, so it could not record anything either.',
  kept: 'Nothing was sent.',
  todo: 'Leave the private window, or allow storage for this page, and open the code again.',
}

/** Asked before sending: a claim that cannot be kept would leave somebody waiting for ever. */
function canKeep(): boolean {
  try {
    window.localStorage.setItem('lockwire.keeps', '1')
    window.localStorage.removeItem('lockwire.keeps')
    return true
  } catch (error) {
    if (error instanceof DOMException) return false
    throw error
  }
}
