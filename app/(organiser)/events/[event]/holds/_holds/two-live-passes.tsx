'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { clockTime } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import { Dialog } from '@/app/_ui/dialog'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { TwoPasses } from '@/lib/contracts/holds'
import { voidPass } from '@/lib/contracts/void-pass'
import { call } from '@/lib/http/call'
import { showTypedCode } from '@/lib/pass/typed-code'

interface TwoLivePassesProps {
  readonly eventId: string
  readonly cars: readonly TwoPasses[]
  readonly timeZone: string
  readonly mayVoid: boolean
  readonly onVoided: () => Promise<void>
}

type OnePass = TwoPasses['passes'][number]

/** Two devices each issued a pass not knowing of the other: both live, and somebody has to say which sticker is on the car. */
export function TwoLivePasses({ eventId, cars, timeZone, mayVoid, onVoided }: TwoLivePassesProps) {
  const [open, setOpen] = useState<{ readonly car: TwoPasses; readonly pass: OnePass } | null>(null)
  if (cars.length === 0) return null
  return (
    <section aria-labelledby="two-passes" className="border-2 p-4">
      <h2 id="two-passes" className="flex items-center gap-2 text-xl">
        <OutcomeShape state="ask" className="size-6" /> Two passes live: void the one whose sticker is not on the car
      </h2>
      <ul>
        {cars.map((car) => (
          <li key={car.entry} id={car.entry} className="flex flex-wrap items-center gap-4 border-t py-3">
            <NumberPlate number={car.number} size="row" />
            <span className="grow">
              {car.model}, {car.plate}
            </span>
            {car.passes.map((pass) => (
              <span key={pass.hash} className="grid gap-1">
                <span>
                  <span className="serial font-bold">{showTypedCode(pass.typedCode)}</span>, {clockTime(pass.at, timeZone)}, {pass.by}
                </span>
                {mayVoid && (
                  <Button look="secondary" onClick={() => setOpen({ car, pass })}>
                    Void {showTypedCode(pass.typedCode)}
                  </Button>
                )}
              </span>
            ))}
          </li>
        ))}
      </ul>
      {open && (
        <VoidDialog
          eventId={eventId}
          car={open.car}
          pass={open.pass}
          onClose={() => setOpen(null)}
          onVoided={async () => {
            await onVoided()
            setOpen(null)
          }}
        />
      )}
    </section>
  )
}

interface VoidDialogProps {
  readonly eventId: string
  readonly car: TwoPasses
  readonly pass: OnePass
  readonly onClose: () => void
  readonly onVoided: () => Promise<void>
}

function VoidDialog({ eventId, car, pass, onClose, onVoided }: VoidDialogProps) {
  const form = useForm({ resolver: zodResolver(voidPass.body), defaultValues: { entry: car.entry, pass: pass.hash, reason: '' } })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (body) => {
    const answer = await call(voidPass, { params: { event: eventId }, body })
    if (answer.ok) await onVoided()
    else form.setError('root', { message: `${answer.problem.what} ${answer.problem.kept} ${answer.problem.todo}` })
  })
  return (
    <Dialog isOpen onClose={onClose} title={`Void ${showTypedCode(pass.typedCode)} of ${car.number}`}>
      <form className="grid gap-4" onSubmit={(event) => void submit(event)}>
        <p>It is HOLD at the pit exit from the next pull on, for good. The other pass goes on living.</p>
        <TextField label="Why" error={errors.reason?.message} {...form.register('reason')} />
        {errors.root?.message !== undefined && <Notice happened={errors.root.message} />}
        <div className="flex flex-wrap justify-end gap-3">
          <Button look="secondary" onClick={onClose}>
            Keep both for now
          </Button>
          <Button type="submit" isBusy={isSubmitting}>
            Declare it void
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
