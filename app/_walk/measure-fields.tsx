'use client'

import { useState } from 'react'
import type { MeasureField } from '@/lib/checklist/checklist'
import { explainJudgement } from '@/lib/rules/explain'
import type { Judgement } from '@/lib/rules/judgement'
import type { ReadValues, Typed } from '@/lib/walk/read-values'
import { JudgementLine, type SourceShown } from './judgement-line'
import { ActiveNumber, NumberField } from './number-field'
import { ValueField } from './value-field'

interface MeasureFieldsProps {
  readonly fields: readonly MeasureField[]
  readonly typed: Typed
  readonly onTyped: (typed: Typed) => void
  /** What cannot be a value, in words. */
  readonly problems: ReadValues['problems']
  /** What the rule says as the values stand; null before there is anything to say. */
  readonly judgement: Judgement | null
  readonly source: readonly SourceShown[] | undefined
}

/** The values of one check. Numbers are keyed on our own keypad, unit beside the figure; the keypad closes when the last number is done. */
export function MeasureFields({ fields, typed, onTyped, problems, judgement, source }: MeasureFieldsProps) {
  const numbers = fields.filter((field) => field.kind === 'number')
  const [active, setActive] = useState<string | null>(firstToKey(fields, typed))
  const set = (id: string, value: string) => onTyped({ ...typed, [id]: value })
  const current = numbers.find((field) => field.id === active)
  const next = () => setActive(numbers[numbers.findIndex((field) => field.id === active) + 1]?.id ?? null)
  const whyNot = (id: string) => problems.find(({ field }) => field === id)?.why
  return (
    <div className="mt-4 grid gap-3">
      {fields.map((field) => {
        const value = typed[field.id] ?? ''
        if (field === current)
          return (
            <ActiveNumber
              key={field.id}
              field={current}
              value={value}
              says={saysOf(value, whyNot(field.id), judgement)}
              isLast={current === numbers.at(-1)}
              onChange={(text) => set(field.id, text)}
              onNext={next}
            />
          )
        return (
          <div key={field.id}>
            {field.kind === 'number' ? (
              <NumberField field={field} value={value} onPick={() => setActive(field.id)} />
            ) : (
              <ValueField field={field} value={value} onChange={(text) => set(field.id, text)} />
            )}
            <p role="alert" className="font-bold">
              {whyNot(field.id)}
            </p>
          </div>
        )
      })}
      {/* What is being keyed is judged beside its keypad: said once, not twice. */}
      <JudgementLine judgement={current && typed[current.id] ? null : judgement} source={source} />
    </div>
  )
}

/** The keypad opens by itself where the first thing asked is a number that was not keyed yet. */
function firstToKey(fields: readonly MeasureField[], typed: Typed): string | null {
  const [first] = fields
  return first?.kind === 'number' && !typed[first.id] ? first.id : null
}

/** What stands beside the figure while it is keyed: that it cannot be, or what the rule makes of it. */
function saysOf(value: string, whyNot: string | undefined, judgement: Judgement | null): string {
  if (value === '') return ''
  return whyNot ?? (judgement ? explainJudgement(judgement.code, judgement.facts) : '')
}
