'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { clockTime, dayWords } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { bayPlanBody, type BayOrderView, planBay } from '@/lib/contracts/bay-order'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'

interface PlanFormProps {
  readonly eventId: string
  readonly order: BayOrderView
  readonly onOrder: (order: BayOrderView) => void
}

/** What the organiser knows of the bay that day; each press works the order out anew, and telling it is a press of its own. */
export function PlanForm({ eventId, order, onOrder }: PlanFormProps) {
  const [problem, setProblem] = useState<Problem | null>(null)
  const form = useForm({ resolver: zodResolver(bayPlanBody), defaultValues: { ...order.plan, publish: false } })
  const { errors, isSubmitting } = form.formState
  const send = (publish: boolean) =>
    form.handleSubmit(async (body) => {
      setProblem(null)
      const answer = await call(planBay, { params: { event: eventId }, body: { ...body, publish } })
      if (answer.ok) onOrder(answer.value)
      else setProblem(answer.problem)
    })
  const figure = { inputMode: 'decimal', autoComplete: 'off' } as const
  const asNumber = { setValueAs: (text: unknown) => (text === '' ? Number.NaN : Number(text)) }
  return (
    <form className="grid gap-4" onSubmit={(event) => void send(false)(event)} noValidate aria-label={`The bay on ${dayWords(order.day)}`}>
      <div className="grid gap-4 sm:grid-cols-3 lg:grid-cols-5">
        <TextField label="Bay opens" description="24 h, venue time" error={errors.opensAt?.message} {...form.register('opensAt')} />
        <TextField
          label="Scrutineers"
          description="side by side"
          error={errors.lanes?.message}
          {...figure}
          {...form.register('lanes', asNumber)}
        />
        <TextField
          label="Window, min"
          description="a call-up window"
          error={errors.windowMin?.message}
          {...figure}
          {...form.register('windowMin', asNumber)}
        />
        <TextField
          label="Minutes a car"
          description="on average"
          error={errors.carMin?.message}
          {...figure}
          {...form.register('carMin', asNumber)}
        />
        <TextField
          label="Scatter, min"
          description="standard deviation"
          error={errors.carSdMin?.message}
          {...figure}
          {...form.register('carSdMin', asNumber)}
        />
      </div>
      {!order.isPlanned && (
        <p className="text-muted">
          Proposals, from common practice: 3 minutes for a known car, 5 for a road car, 8 to 12 for a caged or first-time car.
        </p>
      )}
      {problem && <Notice happened={problem.what} kept={`${problem.kept} What you typed is still here.`} todo={problem.todo} />}
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" look="secondary" isBusy={isSubmitting}>
          Work it out
        </Button>
        <Button isBusy={isSubmitting} onClick={(event) => void send(true)(event)}>
          Tell the entrants
        </Button>
        <p role="status">{toldWords(order)}</p>
      </div>
    </form>
  )
}

function toldWords({ publishedAt, toldOtherwise, timeZone }: BayOrderView): string {
  if (publishedAt === null) return 'Not told yet: entrants see their group’s first session only.'
  const when = `Told at ${clockTime(publishedAt, timeZone)}.`
  if (toldOtherwise === 0) return `${when} Every entrant sees this window on their entry’s page.`
  return `${when} ${toldOtherwise === 1 ? '1 car was' : `${toldOtherwise} cars were`} told another window than this, or none: tell them anew.`
}
