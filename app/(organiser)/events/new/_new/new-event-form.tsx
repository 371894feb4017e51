'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { Controller, useForm, type UseFormReturn } from 'react-hook-form'
import { Button } from '@/app/_ui/button'
import { SelectField, TextAreaField, TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { createEvent, eventBody, type EventBody } from '@/lib/contracts/events'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'

const EMPTY: EventBody = {
  name: '',
  venue: '',
  timeZone: 'Europe/London',
  firstDay: '',
  lastDay: '',
  groups: ['Novice', 'Intermediate', 'Advanced'],
  defaultDepth: 'standard',
  depthPolicy: 'all',
  sampleEvery: 0,
  listStaleMinutes: 30,
}

/** What an event is, in one go; entries, timetable and crew come after it. */
export function NewEventForm() {
  const router = useRouter()
  const [problem, setProblem] = useState<Problem | null>(null)
  const form = useForm<EventBody>({ resolver: zodResolver(eventBody), defaultValues: EMPTY })
  const send = form.handleSubmit(async (body) => {
    setProblem(null)
    const answer = await call(createEvent, { body })
    if (answer.ok) {
      router.push(`/events/${answer.value.event}/timetable`)
      return
    }
    for (const { path, message } of answer.problem.issues ?? []) form.setError(path as keyof EventBody, { message })
    setProblem(answer.problem)
  })
  return (
    <form className="grid gap-5" onSubmit={(event) => void send(event)} noValidate>
      <WhatAndWhen form={form} />
      <HowItIsLookedAt form={form} />
      <p className="text-muted">
        It uses the newest published checklist of a closed circuit with the limits of a track day. Where a limit comes from stands beside it
        in the bay; the venue’s rules, road law and makers’ instructions stand above it.
      </p>
      {problem && <Notice happened={problem.what} kept="Nothing was made; what you typed is still here." todo={problem.todo} />}
      <div>
        <Button type="submit" isBusy={form.formState.isSubmitting}>
          Make the event
        </Button>
      </div>
    </form>
  )
}

function WhatAndWhen({ form: { register, control, formState } }: { readonly form: UseFormReturn<EventBody> }) {
  const { errors } = formState
  return (
    <>
      <TextField label="Name" description="As entrants know it" error={errors.name?.message} {...register('name')} />
      <TextField label="Venue" error={errors.venue?.message} {...register('venue')} />
      <div className="grid gap-5 sm:grid-cols-3">
        <TextField label="First day" type="date" error={errors.firstDay?.message} {...register('firstDay')} />
        <TextField label="Last day" type="date" error={errors.lastDay?.message} {...register('lastDay')} />
        <TextField label="Time zone" description="of the venue" error={errors.timeZone?.message} {...register('timeZone')} />
      </div>
      <Controller
        control={control}
        name="groups"
        render={({ field }) => (
          <TextAreaField
            label="Run groups"
            description="One a line, in their running order"
            rows={4}
            error={errors.groups?.message ?? errors.groups?.root?.message ?? errors.groups?.find?.((one) => one !== undefined)?.message}
            name={field.name}
            onBlur={field.onBlur}
            defaultValue={field.value.join('\n')}
            onChange={({ target }) =>
              field.onChange(
                target.value
                  .split('\n')
                  .map((line) => line.trim())
                  .filter((line) => line !== ''),
              )
            }
          />
        )}
      />
    </>
  )
}

function HowItIsLookedAt({ form: { register, watch, formState } }: { readonly form: UseFormReturn<EventBody> }) {
  const { errors } = formState
  const asNumber = { setValueAs: (text: unknown) => (text === '' ? Number.NaN : Number(text)) }
  return (
    <>
      <SelectField label="How deep a car is looked at, unless somebody says otherwise" {...register('defaultDepth')}>
        <option value="standard">Standard: road car</option>
        <option value="full">Full: first time, caged or modified</option>
        <option value="look-over">Look-over: known car, unchanged</option>
      </SelectField>
      <SelectField label="Which cars are looked at" {...register('depthPolicy')}>
        <option value="all">Every car</option>
        <option value="must-see">Those that must be seen, and a sample</option>
      </SelectField>
      {watch('depthPolicy') === 'must-see' && (
        <TextField
          label="A sample of one car in"
          description="0 for none. A car that nobody saw reads declared only, never passed."
          inputMode="numeric"
          error={errors.sampleEvery?.message}
          {...register('sampleEvery', asNumber)}
        />
      )}
      <TextField
        label="A pit-exit list is stale after, minutes"
        description="Then every car is CHECK until the list is freshened"
        inputMode="numeric"
        error={errors.listStaleMinutes?.message}
        {...register('listStaleMinutes', asNumber)}
      />
    </>
  )
}
