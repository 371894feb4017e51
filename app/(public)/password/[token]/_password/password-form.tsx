'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import Link from 'next/link'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { choosePassword, choosePasswordBody } from '@/lib/contracts/crew-invite'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'

/** Chooses the password; afterwards one signs in with it, so that nobody is let in by a mail alone. */
export function PasswordForm({ token, email }: { readonly token: string; readonly email: string }) {
  const [problem, setProblem] = useState<Problem | null>(null)
  const [isDone, setDone] = useState(false)
  const form = useForm({ resolver: zodResolver(choosePasswordBody), defaultValues: { password: '' } })
  const { errors, isSubmitting } = form.formState
  const send = form.handleSubmit(async (body) => {
    setProblem(null)
    const answer = await call(choosePassword, { params: { token }, body })
    if (answer.ok) {
      setDone(true)
      return
    }
    const said = answer.problem.issues?.find(({ path }) => path === 'password')
    if (said) form.setError('password', { message: said.message })
    else setProblem(answer.problem)
  })
  if (isDone)
    return (
      <Notice
        weight="news"
        happened="Your password is set."
        kept="Every other sign-in of this address has ended."
        todo={
          <Link href="/sign-in" className="text-accent underline underline-offset-4">
            Sign in with it
          </Link>
        }
      />
    )
  return (
    <form className="grid max-w-md gap-4" onSubmit={(event) => void send(event)} noValidate>
      {problem && <Notice happened={problem.what} kept={problem.kept} todo={problem.todo} />}
      <TextField label="E-mail" type="email" autoComplete="username" value={email} readOnly />
      <TextField
        label="New password"
        type="password"
        autoComplete="new-password"
        description="At least twelve letters; a short sentence is good."
        error={errors.password?.message}
        {...form.register('password')}
      />
      <div>
        <Button type="submit" isBusy={isSubmitting}>
          Set it
        </Button>
      </div>
    </form>
  )
}
