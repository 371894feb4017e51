'use client'

import { useState } from 'react'
import type { MeasureField } from '@/lib/checklist/checklist'
import type { Typed } from '@/lib/walk/read-values'
import { Button } from '@/app/_ui/button'
import { Keypad } from '@/app/_ui/keypad'

interface MeasureFieldsProps {
  readonly fields: readonly MeasureField[]
  readonly typed: Typed
  readonly onTyped: (typed: Typed) => void
}

/** More options than this go into a list instead of one button each. */
const BUTTONS_AT_MOST = 5

/** The values of one check. Numbers are keyed on our own keypad, unit beside the figure; the keypad closes when the last number is done. */
export function MeasureFields({ fields, typed, onTyped }: MeasureFieldsProps) {
  const numbers = fields.filter((field) => field.kind === 'number')
  const [active, setActive] = useState<string | null>(numbers[0] && !typed[numbers[0].id] ? numbers[0].id : null)
  const set = (id: string, value: string) => onTyped({ ...typed, [id]: value })
  const current = numbers.find((field) => field.id === active)
  const next = () => setActive(numbers[numbers.findIndex((field) => field.id === active) + 1]?.id ?? null)
  return (
    <div className="mt-4 grid gap-3">
      {fields.map((field) => {
        if (field.kind === 'number')
          return (
            <NumberField
              key={field.id}
              field={field}
              value={typed[field.id] ?? ''}
              active={active === field.id}
              onPick={() => setActive(field.id)}
            />
          )
        if (field.kind === 'text')
          return <TextField key={field.id} field={field} value={typed[field.id] ?? ''} onChange={(value) => set(field.id, value)} />
        return <ChoiceField key={field.id} field={field} value={typed[field.id] ?? ''} onChange={(value) => set(field.id, value)} />
      })}
      {current && (
        <div className="grid gap-2">
          <Keypad
            label={current.label}
            value={typed[current.id] ?? ''}
            unit={current.unit}
            allowsDecimal={current.decimals > 0}
            allowsNegative={current.min < 0}
            onChange={(value) => set(current.id, value)}
          />
          <Button look="secondary" onClick={next}>
            {current === numbers.at(-1) ? 'Done' : 'Next value'}
          </Button>
        </div>
      )}
    </div>
  )
}

type FieldOf<K extends MeasureField['kind']> = Extract<MeasureField, { kind: K }>

interface NumberFieldProps {
  readonly field: FieldOf<'number'>
  readonly value: string
  readonly active: boolean
  readonly onPick: () => void
}

function NumberField({ field, value, active, onPick }: NumberFieldProps) {
  return (
    <button
      type="button"
      onClick={onPick}
      aria-pressed={active}
      className={`target flex items-baseline gap-3 rounded-sm border px-3 py-2 text-left ${active ? 'border-accent outline-2 outline-accent' : 'border-line'}`}
    >
      <span className="grow">{field.label}</span>
      <span className="figures text-4xl">{value === '' ? '–' : value}</span>
      <span className="text-muted">{field.unit}</span>
    </button>
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
