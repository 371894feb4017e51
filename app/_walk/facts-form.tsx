'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { evaluateCondition } from '@/lib/checklist/condition'
import type { Book } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import { DEPTHS, type Depth, type FactDefinition } from '@/lib/checklist/checklist'
import { OneOf } from './one-of'

interface FactsFormProps {
  readonly book: Book
  readonly kind: 'car' | 'person'
  /** What is known before: pinned, declared or told by the list. */
  readonly known: CarFacts
  readonly depth: Depth
  readonly busy: boolean
  readonly onPresent: (facts: CarFacts, depth: Depth) => void
}

const DEPTH_OPTIONS = DEPTHS.map((value) => ({ value, label: depthWords(value) }))

/** What stands before the scrutineer: the facts that decide what is asked. One that nobody answers stays unknown, and then everything is asked. */
export function FactsForm({ book, kind, known, depth: depthBefore, busy, onPresent }: FactsFormProps) {
  const [facts, setFacts] = useState<CarFacts>(known)
  const [depth, setDepth] = useState<Depth>(depthBefore)
  const asked = book.checklist.facts.filter((fact) => fact.subject === kind && isAskedNow(fact, facts))
  const unknown = asked.filter((fact) => (facts[fact.name] ?? undefined) === undefined)
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault()
        const names = new Set(asked.map(({ name }) => name))
        onPresent(Object.fromEntries(Object.entries(facts).filter(([name]) => names.has(name))), depth)
      }}
    >
      {asked.map(({ name, label, values }) => (
        <OneOf
          key={name}
          name={name}
          label={label}
          options={values}
          value={facts[name] ?? undefined}
          onPick={(value) => setFacts({ ...facts, [name]: value })}
          isStrong
        />
      ))}
      {kind === 'car' && <OneOf name="depth" label="How deep" options={DEPTH_OPTIONS} value={depth} onPick={setDepth} isStrong />}
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

function depthWords(depth: Depth): string {
  if (depth === 'look-over') return 'Look-over: known car, unchanged'
  return depth === 'standard' ? 'Standard: road car' : 'Full: first time, caged or modified'
}

/** Asked only once what it hangs on has been said: nobody is asked about a harness before the belts are known. */
function isAskedNow(fact: FactDefinition, facts: CarFacts): boolean {
  return fact.applies === undefined || evaluateCondition(fact.applies, facts) === true
}
