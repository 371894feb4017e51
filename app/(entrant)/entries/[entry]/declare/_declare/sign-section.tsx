'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import * as z from 'zod/mini'
import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { DECLARATION_WORDS, type DeclarationParts } from '@/lib/contracts/declaration'
import { signBody, signDeclaration } from '@/lib/contracts/my-declaration'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'

const signature = z.pick(signBody, { name: true, agrees: true })

interface SignSectionProps {
  readonly entry: string
  readonly me: string
  readonly parts: DeclarationParts
  readonly onSigned: () => void
}

/** The signature: a name under words of one's own responsibility. Half filled may be signed too; what was not said is not answered. */
export function SignSection({ entry, me, parts, onSigned }: SignSectionProps) {
  const [problem, setProblem] = useState<Pick<Problem, 'what' | 'kept' | 'todo'> | null>(null)
  const [leaving, setLeaving] = useState(false)
  const form = useForm<{ name: string; agrees: true }>({ resolver: zodResolver(signature) as never, defaultValues: { name: me } })
  const { errors, isSubmitting } = form.formState

  const send = form.handleSubmit(async (signed) => {
    setProblem(null)
    const answer = await call(signDeclaration, { params: { entry }, body: { ...signed, parts } })
    if (!answer.ok) {
      setProblem(answer.problem)
      return
    }
    onSigned()
    setLeaving(true)
    // eslint-disable-next-line @next/next/no-location-assign-relative-destination -- a whole page: what was kept of the entry before is stale
    window.location.assign(`/entries/${entry}`)
  })

  return (
    <form className="grid gap-4" onSubmit={(event) => void send(event)} noValidate>
      <p className="max-w-prose text-lg">{DECLARATION_WORDS}</p>
      <div>
        <Choice {...form.register('agrees')}>I agree.</Choice>
        <p role="alert" className="font-bold">
          {errors.agrees?.message}
        </p>
      </div>
      <TextField label="Your name, as your signature" autoComplete="name" error={errors.name?.message} {...form.register('name')} />
      {problem && <Notice happened={problem.what} kept="What you filled in is kept." todo={problem.todo} />}
      <Button type="submit" size="large" isBusy={isSubmitting || leaving}>
        Sign the declaration
      </Button>
    </form>
  )
}
