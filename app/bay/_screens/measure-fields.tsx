'use client'

import { useState } from 'react'
import type { MeasureField } from '@/lib/checklist/checklist'
import type { Typed } from '@/lib/walk/read-values'
import { Button } from '@/app/_ui/button'
import { explainJudgement } from '@/lib/rules/explain'
import type { Judgement } from '@/lib/rules/judgement'
import { Keypad } from '@/app/_ui/keypad'

interface MeasureFieldsProps {
  readonly fields: readonly MeasureField[]
  readonly typed: Typed
  readonly onTyped: (typed: Typed) => void
  /** What the rule says as the values stand; null before there is anything to say. */
  readonly judgement: Judgement | null
}

/** More options than this go into a list instead of one button each. */
const BUTTONS_AT_MOST = 5

/** The values of one check. Numbers are keyed on our own keypad, unit beside the figure; the keypad closes when the last number is done. */
export function MeasureFields({ fields, typed, onTyped, judgement }: MeasureFieldsProps) {
  const numbers = fields.filter((field) => field.kind === 'number')
  const [active, setActive] = useState<string | null>(firstToKey(fields, typed))
  const set = (id: string, value: string) => onTyped({ ...typed, [id]: value })
  const current = numbers.find((field) => field.id === active)
  const next = () => setActive(numbers[numbers.findIndex((field) => field.id === active) + 1]?.id ?? null)
  return (
    <div className="mt-4 grid gap-3">
      {fields.map((field) => {
        if (field === current)
          return (
            <ActiveNumber
              key={field.id}
              field={current}
              value={typed[field.id] ?? ''}
              judgement={judgement}
              isLast={current === numbers.at(-1)}
              onChange={(value) => set(field.id, value)}
              onNext={next}
            />
          )
        if (field.kind === 'number')
          return <NumberField key={field.id} field={field} value={typed[field.id] ?? ''} onPick={() => setActive(field.id)} />
        if (field.kind === 'text')
          return <TextField key={field.id} field={field} value={typed[field.id] ?? ''} onChange={(value) => set(field.id, value)} />
        return <ChoiceField key={field.id} field={field} value={typed[field.id] ?? ''} onChange={(value) => set(field.id, value)} />
      })}
    </div>
  )
}

/** The keypad opens by itself where the first thing asked is a number that was not keyed yet. */
function firstToKey(fields: readonly MeasureField[], typed: Typed): string | null {
  const [first] = fields
  return first?.kind === 'number' && !typed[first.id] ? first.id : null
}

type FieldOf<K extends MeasureField['kind']> = Extract<MeasureField, { kind: K }>

interface NumberFieldProps {
  readonly field: FieldOf<'number'>
  readonly value: string
  readonly onPick: () => void
}

function NumberField({ field, value, onPick }: NumberFieldProps) {
  return (
    <button type="button" onClick={onPick} className="target flex items-baseline gap-3 rounded-sm border border-line px-3 py-2 text-left">
      <span className="grow">{field.label}</span>
      <span className="figures text-4xl">{value === '' ? '–' : value}</span>
      <span className="text-muted">{field.unit}</span>
    </button>
  )
}

interface ActiveNumberProps extends ValueFieldProps<FieldOf<'number'>> {
  readonly judgement: Judgement | null
  readonly isLast: boolean
  readonly onNext: () => void
}

/** The number that is being keyed, judged at each keystroke with the figure that decided. */
function ActiveNumber({ field, value, judgement, isLast, onChange, onNext }: ActiveNumberProps) {
  return (
    <div className="grid gap-2 border-l-4 border-accent pl-3">
      <p aria-hidden="true">{field.label}</p>
      <Keypad
        label={field.label}
        value={value}
        unit={field.unit}
        allowsDecimal={field.decimals > 0}
        allowsNegative={field.min < 0}
        onChange={onChange}
        judgement={value !== '' && judgement ? explainJudgement(judgement.code, judgement.facts) : ''}
      />
      <Button look="secondary" onClick={onNext}>
        {isLast ? 'Done' : 'Next value'}
      </Button>
    </div>
  )
}

interface ValueFieldProps<F> {
  readonly field: F
  readonly value: string
  readonly onChange: (value: string) => void
}

function TextField({ field, value, onChange }: ValueFieldProps<FieldOf<'text'>>) {
  return (
    <label className="grid gap-1">
      <span>{field.label}</span>
      <input
        className="serial target rounded-sm border border-line bg-ground px-3 text-2xl uppercase"
        value={value}
        maxLength={field.maxLength}
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        inputMode="text"
        onChange={(event) => onChange(event.target.value)}
      />
      {field.hint && <span className="text-muted">{field.hint}</span>}
    </label>
  )
}

function ChoiceField({ field, value, onChange }: ValueFieldProps<FieldOf<'choice'>>) {
  if (field.options.length > BUTTONS_AT_MOST)
    return (
      <label className="grid gap-1">
        <span>{field.label}</span>
        <select
          className="target rounded-sm border border-line bg-ground px-3"
          value={value}
          onChange={(event) => onChange(event.target.value)}
        >
          <option value="">not chosen</option>
          {field.options.map((option) => (
            <option key={option.id} value={option.id}>
              {option.label}
            </option>
          ))}
        </select>
      </label>
    )
  return (
    <fieldset>
      <legend>{field.label}</legend>
      <div className="mt-1 flex flex-wrap gap-2">
        {field.options.map((option) => (
          <label
            key={option.id}
            className="target flex items-center gap-2 rounded-sm border border-line px-3 has-checked:border-accent has-checked:bg-accent has-checked:text-accent-ink"
          >
            <input
              type="radio"
              className="size-5 accent-current"
              name={field.id}
              checked={value === option.id}
              onChange={() => onChange(option.id)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  )
}
