'use client'

import { useState } from 'react'
import { dayWords } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { Notice } from '@/app/_ui/notice'
import { keepCar } from '@/lib/contracts/my-garage'
import type { Problem } from '@/lib/contracts/problem'
import { declaredItems } from '@/lib/entrants/declared-items'
import { fieldsAsked } from '@/lib/entrants/fields-asked'
import { factsToKeep } from '@/lib/entrants/kept-parts'
import type { CarCard } from '@/lib/entrants/queries/car-card'
import { call } from '@/lib/http/call'
import { civilDate } from '@/lib/rules/civil-date'
import { readValues } from '@/lib/walk/read-values'
import { AnswerFields } from '../../_answers/answer-fields'
import { FactFields } from '../../_answers/fact-fields'
import { PreCheckLine } from '../../_answers/pre-check-line'
import { formOf, partsOfForm } from '../../_answers/form-state'

/** What is known of a car, kept for its next event and judged by the rules of the next one. */
export function CarForm({ card }: { readonly card: CarCard }) {
  const { car, facts, checks, places, judgedFor } = card
  const [form, setForm] = useState(() => formOf(card.kept))
  const [saved, setSaved] = useState<'no' | 'busy' | 'yes'>('no')
  const [problem, setProblem] = useState<Problem | null>(null)
  if (judgedFor === null)
    return <EmptyState title="No event yet">What is asked of a car comes with an event’s checklist; there is none yet.</EmptyState>
  const parts = partsOfForm(form, checks)
  const items = declaredItems(checks, parts, [], civilDate(judgedFor.lastDay))
  const change = (next: typeof form) => {
    setForm(next)
    setSaved('no')
  }
  const save = async () => {
    setSaved('busy')
    const answer = await call(keepCar, { params: { car: car.id }, body: { facts: factsToKeep(parts, checks) } })
    setSaved(answer.ok ? 'yes' : 'no')
    setProblem(answer.ok ? null : answer.problem)
  }
  return (
    <div className="grid gap-6">
      <p className="max-w-prose">
        Kept for next time, so that nothing is typed twice. Judged here as for {judgedFor.event}, {dayWords(judgedFor.lastDay)}. Nothing is
        declared until you sign for an event.
      </p>
      <FactFields facts={facts} said={form.facts} onSaid={(said) => change({ ...form, facts: said })} />
      {items.map((item) => {
        const typed = form.typed[item.key] ?? {}
        const fields = fieldsAsked(item.check, typed)
        const { problems } = readValues(fields, typed)
        const place = places.find(({ id }) => id === item.check.place)?.title ?? ''
        return (
          <section key={item.key} aria-label={`${place}: ${item.check.short}`} className="grid gap-3 border-t-[1.5px] pt-4">
            <h2 className="text-lg">
              {place}: {item.check.prompt}
            </h2>
            <AnswerFields
              name={item.key}
              fields={fields}
              typed={typed}
              problems={problems}
              onTyped={(next) => change({ ...form, typed: { ...form.typed, [item.key]: next } })}
            />
            <PreCheckLine
              check={item.check}
              preCheck={item.preCheck}
              judgement={item.judgement}
              isEmpty={problems.length > 0 || Object.values(typed).every((text) => text.trim() === '')}
            />
          </section>
        )
      })}
      {problem && <Notice happened={problem.what} kept="What you typed is still here." todo={problem.todo} />}
      <div className="grid gap-2">
        <Button size="large" isBusy={saved === 'busy'} onClick={() => void save()}>
          Keep it
        </Button>
        <p role="status" className="font-bold">
          {saved === 'yes' ? 'Kept for next time.' : ''}
        </p>
      </div>
    </div>
  )
}
