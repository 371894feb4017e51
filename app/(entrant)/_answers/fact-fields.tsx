'use client'

import { OneOf } from '@/app/_walk/one-of'
import { evaluateCondition } from '@/lib/checklist/condition'
import type { FactDefinition } from '@/lib/checklist/checklist'
import type { Figures } from '@/lib/contracts/declaration'

interface FactFieldsProps {
  readonly facts: readonly FactDefinition[]
  readonly said: Figures
  readonly onSaid: (said: Figures) => void
}

/** What the car is. It decides what is asked; a fact is asked only once what it hangs on was said. */
export function FactFields({ facts, said, onSaid }: FactFieldsProps) {
  const asked = facts.filter(({ applies }) => applies === undefined || evaluateCondition(applies, said) === true)
  return (
    <div className="grid gap-4">
      {asked.map(({ name, label, values }) => (
        <OneOf
          key={name}
          name={`fact ${name}`}
          label={label}
          options={values}
          value={said[name] ?? undefined}
          onPick={(value) => onSaid({ ...said, [name]: value })}
          isStrong
        />
      ))}
    </div>
  )
}
