'use client'

import { TextAreaField } from '@/app/_ui/field'
import type { BookCheck } from '@/lib/checklist/book'
import { readDeclaredKey } from '@/lib/checklist/declarable'
import type { FactDefinition } from '@/lib/checklist/checklist'
import type { DeclarationParts } from '@/lib/contracts/declaration'
import { changedParts, reopenedBy } from '@/lib/entrants/changed-parts'

interface ChangesSectionProps {
  readonly now: DeclarationParts
  /** The last signed version, or what was kept of the car; null for a car nobody knows here. */
  readonly before: DeclarationParts | null
  readonly beforeWords: string
  readonly isSigned: boolean
  readonly facts: readonly FactDefinition[]
  readonly checks: readonly BookCheck[]
  readonly onChanges: (words: string) => void
}

/** What has changed, worked out where it can be, and the entrant's own words for the rest; with what the bay sees again because of it. */
export function ChangesSection({ now, before, beforeWords, isSigned, facts, checks, onChanges }: ChangesSectionProps) {
  const changed = before ? changedParts(before, now) : { facts: [], answers: [] }
  const names = [
    ...facts.filter(({ name }) => changed.facts.includes(name)).map(({ label }) => label.toLowerCase()),
    ...new Set(checks.filter(({ id }) => changed.answers.some((key) => readDeclaredKey(key).check === id)).map(({ short }) => short)),
  ]
  const again = isSigned ? [...new Set(reopenedBy(changed, checks).map(({ short }) => short))] : []
  return (
    <section aria-labelledby="changes" className="grid gap-3 border-t-[3px] pt-5">
      <h2 id="changes" className="text-2xl">
        What has changed
      </h2>
      {before !== null && (
        <p role="status">
          {names.length === 0 ? `Nothing is said otherwise than ${beforeWords}.` : `Otherwise than ${beforeWords}: ${names.join(', ')}.`}
        </p>
      )}
      {again.length > 0 && <p>The bay looks again at: {again.join(', ')}.</p>}
      <TextAreaField
        label="Changed on the car since it was last shown"
        description="Pads, hoses, wheels, seat, belts, cage, engine: whatever a spanner was on."
        isOptional
        maxLength={2000}
        value={now.changes}
        onChange={({ target }) => onChanges(target.value)}
      />
    </section>
  )
}
