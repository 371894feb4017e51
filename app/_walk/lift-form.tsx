'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { StationPicks } from '@/app/_crew/station-picks'
import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import { TextAreaField } from '@/app/_ui/field'
import type { Against } from '@/lib/inspection/stands-against'
import { isKnown } from '@/lib/inspection/record'
import type { Draft } from '@/lib/sync/client/draft'
import { ChiefSheet } from './chief-sheet'
import { wordsHere } from './words-here'
import type { Walk } from './use-walk'

interface LiftFormProps {
  readonly walk: Walk
  /** Holds and recalls that have not ended. */
  readonly against: readonly Against[]
}

/**
 * The chief lifts holds and recalls without a new look, and says why. What is still to be seen stays held by a hold of its own: the only way to make one
 * narrower. What was written stays until it is saved.
 */
export function LiftForm({ walk, against }: LiftFormProps) {
  const day = useDay()
  const [isOpen, setOpen] = useState(false)
  const [why, setWhy] = useState('')
  const [left, setLeft] = useState<readonly string[]>([])
  const [kept, setKept] = useState<readonly string[]>([])
  const lifting = against.filter(({ hash }) => !left.includes(hash))
  const stations = [...new Set(lifting.flatMap(({ block }) => block?.stations ?? []))]
  const stillHeld = kept.filter((id) => stations.includes(id))
  return (
    <>
      <Button look="secondary" className="justify-self-start" onClick={() => setOpen(true)}>
        Lift without a new look
      </Button>
      {isOpen && (
        <ChiefSheet
          title="Lift without a new look"
          does={stillHeld.length > 0 ? 'Lift it, and hold it for less' : 'Lift it'}
          isReady={lifting.length > 0 && why.trim().length >= 3}
          save={() => day.record(liftDrafts(walk, lifting, stillHeld, why.trim()))}
          onClose={() => setOpen(false)}
        >
          <Which against={against} walk={walk} left={left} onLeft={setLeft} />
          <TextAreaField
            label="Why it needs no new look"
            value={why}
            maxLength={500}
            required
            onChange={({ target }) => setWhy(target.value)}
          />
          {stations.length > 0 && (
            <StationPicks
              legend="Still to be seen: it stays held for these alone"
              stations={stations.map((id) => ({ id, title: walk.book?.stations.get(id)?.title ?? id }))}
              picked={kept}
              onPick={setKept}
            />
          )}
        </ChiefSheet>
      )}
    </>
  )
}

interface WhichProps extends LiftFormProps {
  readonly left: readonly string[]
  readonly onLeft: (left: readonly string[]) => void
}

/** What is lifted: all of it, unless a box is cleared. */
function Which({ walk, against, left, onLeft }: WhichProps) {
  const day = useDay()
  return (
    <fieldset>
      <legend className="font-bold">What is lifted</legend>
      {against.map((one) => (
        <Choice
          key={one.hash}
          checked={!left.includes(one.hash)}
          onChange={() => onLeft(left.includes(one.hash) ? left.filter((hash) => hash !== one.hash) : [...left, one.hash])}
        >
          {wordsHere(day, one, walk).what}
        </Choice>
      ))}
    </fieldset>
  )
}

/** One action: lifted, and what is left held anew under the reason of the newest hold lifted. */
function liftDrafts({ subject }: Walk, lifting: readonly Against[], kept: readonly string[], why: string): readonly Draft[] {
  const lifted = { kind: 'lifted', subject, holds: lifting.map(({ hash }) => hash), why } as const
  const holds = lifting.flatMap(({ record }) => (isKnown(record) && record.kind === 'hold' ? [record] : []))
  const [newest] = holds
  if (newest === undefined || kept.length === 0) return [lifted]
  return [lifted, { kind: 'hold', subject, reason: newest.reason, stations: kept, checks: [], stickerRemoved: newest.stickerRemoved }]
}
