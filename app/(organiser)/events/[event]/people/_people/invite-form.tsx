'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { Button } from '@/app/_ui/button'
import { SelectField, TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { crewInviteBody, inviteCrew } from '@/lib/contracts/crew-invite'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'
import { CREW_ROLES } from '@/lib/permissions/policy'

/** Puts somebody with an e-mail address into the crew: the way to be chief, and for whoever prepares at home. */
export function InviteForm({ eventId, onInvited }: { readonly eventId: string; readonly onInvited: () => void }) {
  const [problem, setProblem] = useState<Problem | null>(null)
  const [said, setSaid] = useState('')
  const form = useForm({ resolver: zodResolver(crewInviteBody), defaultValues: { name: '', email: '', role: 'scrutineer' as const } })
  const { errors, isSubmitting } = form.formState
  const send = form.handleSubmit(async (body) => {
    setProblem(null)
    setSaid('')
    const answer = await call(inviteCrew, { params: { event: eventId }, body })
    if (!answer.ok) {
      setProblem(answer.problem)
      return
    }
    const { isAdded, isNew } = answer.value
    setSaid(
      !isAdded
        ? `${body.name} is ${body.role} already.`
        : isNew
          ? 'Put down; a mail with a link to choose a password is on its way.'
          : 'Put down; a mail tells them.',
    )
    if (isAdded) form.reset({ name: '', email: '', role: body.role as 'scrutineer' })
    onInvited()
  })
  return (
    <form className="grid content-start gap-4 border-2 p-4" onSubmit={(event) => void send(event)} noValidate aria-labelledby="invite">
      <h2 id="invite" className="text-2xl">
        Invite by e-mail
      </h2>
      <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
      <TextField label="E-mail" type="email" autoComplete="off" error={errors.email?.message} {...form.register('email')} />
      <SelectField label="Role" {...form.register('role')}>
        {CREW_ROLES.map((role) => (
          <option key={role} value={role}>
            {role}
          </option>
        ))}
      </SelectField>
      {problem && <Notice happened={problem.what} kept={`${problem.kept} What you typed is still here.`} todo={problem.todo} />}
      <Button type="submit" look="secondary" isBusy={isSubmitting}>
        Invite
      </Button>
      <p role="status">{said}</p>
    </form>
  )
}
