'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import type { Problem } from '@/lib/contracts/problem'
import { signIn, signInBody } from '@/lib/contracts/sign-in'
import { call } from '@/lib/http/call'

/** Signs in, then goes where the person was going, or lets the server lead them to their work. */
export function SignInForm({ next }: { readonly next: string | null }) {
  const [problem, setProblem] = useState<Problem | null>(null)
  const [leaving, setLeaving] = useState(false)
  const form = useForm({ resolver: zodResolver(signInBody), defaultValues: { email: '', password: '' } })
  const { errors, isSubmitting } = form.formState

  const send = form.handleSubmit(async (body) => {
    setProblem(null)
    const answer = await call(signIn, { body })
    if (!answer.ok) {
      setProblem(answer.problem)
      return
    }
    setLeaving(true)
    // A whole page, not a soft one: nothing that was rendered for nobody may stay in memory. The server leads on by role.
    window.location.assign(next ?? '/sign-in')
  })

  return (
    <form className="grid max-w-md gap-4" onSubmit={(event) => void send(event)} noValidate>
      {problem && <Notice happened={problem.what} todo={problem.todo} />}
      <TextField label="E-mail" type="email" autoComplete="username" error={errors.email?.message} {...form.register('email')} />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        error={errors.password?.message}
        {...form.register('password')}
      />
      <div>
        <Button type="submit" isBusy={isSubmitting || leaving}>
          Sign in
        </Button>
      </div>
    </form>
  )
}
