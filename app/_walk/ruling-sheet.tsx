'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { Choice } from '@/app/_ui/choice'
import { TextAreaField } from '@/app/_ui/field'
import type { RulingOutcome } from '@/lib/inspection/ruling-choices'
import { ChiefSheet } from './chief-sheet'
import { HEAD_WORDS } from './heads-so-far'
import { LooksSideBySide } from './looks-side-by-side'
import type { Walk } from './use-walk'

interface RulingSheetProps {
  readonly walk: Walk
  readonly check: string
  /** What the ruling may say; empty where there is nothing to rule on. */
  readonly choices: readonly RulingOutcome[]
  readonly onClose: () => void
}

/** The chief ends a disagreement: both looks beside each other, the one outcome that stands from now on, and why. It names all of them. */
export function RulingSheet({ walk, check, choices, onClose }: RulingSheetProps) {
  const day = useDay()
  const [outcome, setOutcome] = useState<RulingOutcome | null>(null)
  const [why, setWhy] = useState('')
  const heads = walk.state.checks.get(check)?.heads ?? []
  const definition = walk.book?.byId.get(check) ?? null
  return (
    <ChiefSheet
      title={definition?.prompt ?? check}
      does={outcome === null ? 'Rule' : `Rule: ${HEAD_WORDS[outcome]}`}
      isReady={outcome !== null && why.trim().length >= 3}
      save={() => day.record(outcome === null ? [] : [{ kind: 'ruling', subject: walk.subject, check, outcome, why: why.trim() }])}
      onClose={onClose}
    >
      <LooksSideBySide heads={heads} check={definition} />
      {choices.length === 0 ? (
        <p className="font-bold">The later look was made knowing the earlier one: nothing to rule on. A new look ends it.</p>
      ) : (
        <>
          <fieldset>
            <legend className="font-bold">What stands</legend>
            {choices.map((one) => (
              <Choice key={one} type="radio" name="ruling" checked={outcome === one} onChange={() => setOutcome(one)}>
                {HEAD_WORDS[one]}
              </Choice>
            ))}
          </fieldset>
          {choices.length === 1 && <p>Its own figures fail: no ruling makes that milder.</p>}
          <TextAreaField label="Why" value={why} maxLength={500} required onChange={({ target }) => setWhy(target.value)} />
        </>
      )}
    </ChiefSheet>
  )
}
