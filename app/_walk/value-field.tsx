import type { MeasureField } from '@/lib/checklist/checklist'
import { SelectField, TextField } from '@/app/_ui/field'
import { OneOf } from './one-of'

interface ValueFieldProps {
  readonly field: Exclude<MeasureField, { kind: 'number' }>
  readonly value: string
  readonly onChange: (value: string) => void
}

/** More options than this go into a list instead of one press each. */
const PRESSES_AT_MOST = 5

/** A value that is no number: a text as it is printed, or one of a list. */
export function ValueField({ field, value, onChange }: ValueFieldProps) {
  if (field.kind === 'text')
    return (
      <TextField
        label={field.label}
        description={field.hint}
        className="serial text-2xl uppercase"
        value={value}
        maxLength={field.maxLength}
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        onChange={(event) => onChange(event.target.value)}
      />
    )
  const options = field.options.map(({ id, label }) => ({ value: id, label }))
  if (options.length <= PRESSES_AT_MOST)
    return <OneOf name={field.id} label={field.label} options={options} value={value === '' ? undefined : value} onPick={onChange} />
  return (
    <SelectField label={field.label} value={value} onChange={(event) => onChange(event.target.value)}>
      <option value="">not chosen</option>
      {options.map((option) => (
        <option key={option.value} value={option.value}>
          {option.label}
        </option>
      ))}
    </SelectField>
  )
}
