'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { evaluateCondition } from '@/lib/checklist/condition'
import type { Book } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import { DEPTHS, type Depth } from '@/lib/checklist/checklist'

interface FactsFormProps {
  readonly book: Book
  readonly kind: 'car' | 'person'
  /** What is known before: pinned, declared or told by the list. */
  readonly known: CarFacts
  readonly depth: Depth
  readonly busy: boolean
  readonly onPresent: (facts: CarFacts, depth: Depth) => void
}

const DEPTH_WORDS: Readonly<Record<Depth, string>> = {
  'look-over': 'Look-over: known car, unchanged',
  standard: 'Standard: road car',
  full: 'Full: first time, caged or modified',
}

/** What stands before the scrutineer: the facts that decide what is asked. One that nobody answers stays unknown, and then everything is asked. */
export function FactsForm({ book, kind, known, depth: depthBefore, busy, onPresent }: FactsFormProps) {
  const [facts, setFacts] = useState<CarFacts>(known)
  const [depth, setDepth] = useState<Depth>(depthBefore)
  const asked = book.checklist.facts.filter((fact) => fact.subject === kind && isAskedNow(fact, facts))
  const unknown = asked.filter((fact) => facts[fact.name] === undefined)
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault()
        const names = new Set(asked.map(({ name }) => name))
        onPresent(Object.fromEntries(Object.entries(facts).filter(([name]) => names.has(name))), depth)
      }}
    >
      {asked.map((fact) => (
        <Choice
          key={fact.name}
          name={fact.name}
          label={fact.label}
          options={fact.values.map(({ value, label }) => ({ value: String(value), label, raw: value }))}
          value={facts[fact.name] === undefined ? null : String(facts[fact.name])}
          onPick={(raw) => setFacts({ ...facts, [fact.name]: raw })}
        />
      ))}
      {kind === 'car' && (
        <Choice
          name="depth"
          label="How deep"
          options={DEPTHS.map((value) => ({ value, label: DEPTH_WORDS[value], raw: value }))}
          value={depth}
          onPick={(raw) => setDepth(raw)}
        />
      )}
      {unknown.length > 0 && (
        <p className="text-muted">
          Not answered: {unknown.map(({ label }) => label.toLowerCase()).join(', ')}. What depends on it will be asked.
        </p>
      )}
      <Button type="submit" size="large" isBusy={busy}>
        {kind === 'car' ? 'Begin the walk' : 'Begin'}
      </Button>
    </form>
  )
}

/** Asked only once what it hangs on has been said: nobody is asked about a harness before the belts are known. */
function isAskedNow(fact: Book['checklist']['facts'][number], facts: CarFacts): boolean {
  return fact.applies === undefined || evaluateCondition(fact.applies, facts) === true
}

interface ChoiceProps<T> {
  readonly name: string
  readonly label: string
  readonly options: readonly { readonly value: string; readonly label: string; readonly raw: T }[]
  readonly value: string | null
  readonly onPick: (value: T) => void
}

function Choice<T>({ name, label, options, value, onPick }: ChoiceProps<T>) {
  return (
    <fieldset>
      <legend className="font-bold">{label}</legend>
      <div className="mt-1 flex flex-wrap gap-2">
        {options.map((option) => (
          <label
            key={option.value}
            className="target flex items-center gap-2 rounded-sm border border-line px-3 py-2 has-checked:border-accent has-checked:bg-accent has-checked:text-accent-ink"
          >
            <input
              type="radio"
              className="size-5 accent-current"
              name={name}
              checked={value === option.value}
              onChange={() => onPick(option.raw)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  )
}
