'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import * as z from 'zod/mini'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { addCar, carBody } from '@/lib/contracts/my-garage'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'

const newCar = z.pick(carBody, { model: true, colour: true, plate: true })

/** Adds a car and leads to its page, where what is known of it is kept. */
export function AddCar() {
  const router = useRouter()
  const [isOpen, setOpen] = useState(false)
  const [problem, setProblem] = useState<Pick<Problem, 'what' | 'kept' | 'todo'> | null>(null)
  const form = useForm({ resolver: zodResolver(newCar), defaultValues: { model: '', colour: '', plate: '' } })
  const { errors, isSubmitting } = form.formState

  const send = form.handleSubmit(async (car) => {
    setProblem(null)
    const answer = await call(addCar, { body: { ...car, facts: {} } })
    if (answer.ok) router.push(`/cars/${answer.value.id}`)
    else setProblem(answer.problem)
  })

  if (!isOpen)
    return (
      <Button look="secondary" className="justify-self-start" onClick={() => setOpen(true)}>
        Add a car
      </Button>
    )
  return (
    <form className="grid gap-4 border-t-[3px] pt-4" onSubmit={(event) => void send(event)} noValidate>
      <h2 className="text-xl">Add a car</h2>
      {problem && <Notice happened={problem.what} kept="What you typed is still here." todo={problem.todo} />}
      <TextField label="Make and model" autoComplete="off" error={errors.model?.message} {...form.register('model')} />
      <TextField label="Colour" autoComplete="off" error={errors.colour?.message} {...form.register('colour')} />
      <TextField
        label="Plate"
        description="As it stands on the car; the chassis number where it has none."
        className="serial uppercase"
        autoComplete="off"
        autoCapitalize="characters"
        error={errors.plate?.message}
        {...form.register('plate')}
      />
      <div className="flex gap-3">
        <Button type="submit" isBusy={isSubmitting}>
          Add it
        </Button>
        <Button look="quiet" onClick={() => setOpen(false)}>
          Leave it
        </Button>
      </div>
    </form>
  )
}
