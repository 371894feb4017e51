'use client'

import { ServedPhoto } from '@/app/_photos/served-photo'
import { Button } from '@/app/_ui/button'
import type { BookCheck } from '@/lib/checklist/book'
import { preCheck } from '@/lib/checklist/pre-check'
import type { KitKind } from '@/lib/contracts/my-garage'
import { kitCheck, kitFields } from '@/lib/entrants/kit-fields'
import type { MyKit } from '@/lib/entrants/queries/my-garage'
import { civilDate } from '@/lib/rules/civil-date'
import { PreCheckLine } from '../../_answers/pre-check-line'

export const KIT_WORDS: Readonly<Record<KitKind, string>> = {
  helmet: 'Helmet',
  'head-restraint': 'Head restraint',
  suit: 'Suit',
  gloves: 'Gloves',
  other: 'Something else',
}

interface KitLineProps {
  readonly piece: MyKit
  readonly checks: readonly BookCheck[]
  readonly lastDay: string | null
  readonly onOpen: () => void
}

/** One piece: what it is, what its label says, and what the next event's rules make of it. */
export function KitLine({ piece, checks, lastDay, onOpen }: KitLineProps) {
  const check = kitCheck(piece.kind, checks)
  const judged = check && lastDay !== null ? preCheck(check, piece.values, {}, civilDate(lastDay)) : null
  return (
    <div className="grid gap-2">
      <div className="flex items-start justify-between gap-3">
        <div>
          <p className="text-muted">
            {KIT_WORDS[piece.kind]}
            {piece.retired && ', put away'}
          </p>
          <h2 className="text-lg">{piece.name}</h2>
          <p>{valuesInWords(piece, check)}</p>
        </div>
        {piece.photoHash !== null && <ServedPhoto hash={piece.photoHash} words={`Label of ${piece.name}`} />}
      </div>
      {judged && check && !piece.retired && <PreCheckLine check={check} {...judged} isEmpty={Object.keys(piece.values).length === 0} />}
      <Button look="secondary" className="justify-self-start" onClick={onOpen} aria-label={`Change ${piece.name}`}>
        Change
      </Button>
    </div>
  )
}

function valuesInWords({ values }: MyKit, check: BookCheck | null): string {
  return kitFields(check)
    .flatMap((field) => {
      const value = values[field.id]
      if (value === undefined || value === null || value === '') return []
      const words = field.kind === 'choice' ? (field.options.find(({ id }) => id === value)?.label ?? String(value)) : String(value)
      return [`${field.label}: ${words}`]
    })
    .join(' · ')
}
