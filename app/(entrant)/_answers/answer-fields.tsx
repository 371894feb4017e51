'use client'

import { OneOf } from '@/app/_walk/one-of'
import { SelectField, TextField } from '@/app/_ui/field'
import type { MeasureField } from '@/lib/checklist/checklist'
import type { ReadValues, Typed } from '@/lib/walk/read-values'

interface AnswerFieldsProps {
  /** Makes the names of its radio buttons its own. */
  readonly name: string
  readonly fields: readonly MeasureField[]
  readonly typed: Typed
  readonly problems: ReadValues['problems']
  readonly onTyped: (typed: Typed) => void
}

/** More options than this go into a list instead of one press each. */
const PRESSES_AT_MOST = 4

/** The values of one check with the phone's own keyboard: figures, texts as printed, one of a list. An empty one is not answered. */
export function AnswerFields({ name, fields, typed, problems, onTyped }: AnswerFieldsProps) {
  const isNarrow = fields.length > 1 && fields.every(({ kind }) => kind === 'number')
  return (
    <div className={isNarrow ? 'grid grid-cols-2 items-end gap-3' : 'grid gap-3'}>
      {fields.map((field) => (
        <AnswerField
          key={field.id}
          name={`${name} ${field.id}`}
          field={field}
          value={typed[field.id] ?? ''}
          error={problems.find((problem) => problem.field === field.id)?.why}
          onChange={(value) => onTyped({ ...typed, [field.id]: value })}
        />
      ))}
    </div>
  )
}

interface AnswerFieldProps {
  readonly name: string
  readonly field: MeasureField
  readonly value: string
  readonly error: string | undefined
  readonly onChange: (value: string) => void
}

function AnswerField({ name, field, value, error, onChange }: AnswerFieldProps) {
  if (field.kind === 'choice') {
    const options = field.options.map(({ id, label }) => ({ value: id, label }))
    if (options.length <= PRESSES_AT_MOST)
      return <OneOf name={name} label={field.label} options={options} value={value === '' ? undefined : value} onPick={onChange} />
    return (
      <SelectField label={field.label} value={value} onChange={({ target }) => onChange(target.value)}>
        <option value="">not chosen</option>
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </SelectField>
    )
  }
  const isNumber = field.kind === 'number'
  return (
    <TextField
      label={isNumber && field.unit !== '' ? `${field.label}, ${field.unit}` : field.label}
      description={field.kind === 'text' ? field.hint : undefined}
      className={isNumber ? 'serial text-xl' : 'serial text-xl uppercase'}
      inputMode={isNumber ? (field.decimals > 0 ? 'decimal' : 'numeric') : 'text'}
      maxLength={isNumber ? 12 : field.maxLength}
      autoComplete="off"
      autoCapitalize="characters"
      spellCheck={false}
      value={value}
      error={error}
      onChange={({ target }) => onChange(target.value)}
    />
  )
}
