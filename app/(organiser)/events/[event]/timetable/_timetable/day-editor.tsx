'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useFieldArray, useForm } from 'react-hook-form'
import { dayWords } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { saveTimetable, timetableBody, type TimetableBlockBody } from '@/lib/contracts/events'
import type { Problem } from '@/lib/contracts/problem'
import { inOrder, timetableProblems } from '@/lib/events/timetable-of-day'
import { call } from '@/lib/http/call'
import { LineEditor } from './line-editor'
import { nextLine } from './next-line'

interface DayEditorProps {
  readonly eventId: string
  readonly day: string
  readonly groups: readonly { readonly id: string; readonly name: string }[]
  readonly lines: readonly TimetableBlockBody[]
  /** Other days with a timetable, to begin from. */
  readonly others: readonly { readonly day: string; readonly lines: readonly TimetableBlockBody[] }[]
  readonly onSaved: (lines: readonly TimetableBlockBody[]) => void
}

/** One day's timetable as a table of fields, saved whole: what cannot be so is said beside its line, and then nothing was saved. */
export function DayEditor({ eventId, day, groups, lines, others, onSaved }: DayEditorProps) {
  const [problem, setProblem] = useState<Problem | null>(null)
  const form = useForm({ resolver: zodResolver(timetableBody), defaultValues: { day, blocks: [...lines] } })
  const { fields, append, remove, replace } = useFieldArray({ control: form.control, name: 'blocks' })
  const { isSubmitting, isDirty } = form.formState
  const send = form.handleSubmit(async (body) => {
    setProblem(null)
    const faults = timetableProblems(body.blocks, new Set(groups.map(({ id }) => id)))
    for (const { line, field, words } of faults) form.setError(`blocks.${line}.${field}`, { message: words })
    if (faults.length > 0) return
    const answer = await call(saveTimetable, { params: { event: eventId }, body })
    if (answer.ok) {
      onSaved(inOrder(body.blocks))
      return
    }
    for (const { path, message } of answer.problem.issues ?? []) form.setError(path as `blocks.${number}.startsAt`, { message })
    setProblem(answer.problem)
  })
  return (
    <form className="grid gap-3" onSubmit={(event) => void send(event)} noValidate aria-label={`Timetable of ${dayWords(day)}`}>
      {fields.length === 0 && <p className="text-muted">Nothing is planned for this day yet. Bay order and forecasts need the sessions.</p>}
      <ol className="grid">
        {fields.map((field, index) => (
          <LineEditor key={field.id} form={form} index={index} groups={groups} onRemove={() => remove(index)} />
        ))}
      </ol>
      {problem && (
        <Notice happened={problem.what} kept="What stood there before still stands; what you typed is still here." todo={problem.todo} />
      )}
      <div className="flex flex-wrap items-center gap-3">
        <Button look="secondary" onClick={() => append(nextLine(form.getValues('blocks'), groups))}>
          Add a line
        </Button>
        {fields.length === 0 &&
          others.map((other) => (
            <Button key={other.day} look="secondary" onClick={() => replace([...other.lines])}>
              As on {dayWords(other.day)}
            </Button>
          ))}
        <Button type="submit" isBusy={isSubmitting}>
          Save the day
        </Button>
        <p role="status">{isDirty ? 'Not saved yet.' : fields.length > 0 ? 'Saved.' : ''}</p>
      </div>
    </form>
  )
}
