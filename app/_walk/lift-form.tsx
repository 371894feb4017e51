'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { StationPicks } from '@/app/_crew/station-picks'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import { TextField } from '@/app/_ui/field'
import type { Against } from '@/lib/inspection/stands-against'
import { isKnown } from '@/lib/inspection/record'
import type { Draft } from '@/lib/sync/client/draft'
import { wordsHere } from './words-here'
import type { Walk } from './use-walk'

interface LiftFormProps {
  readonly walk: Walk
  /** Holds and recalls that have not ended. */
  readonly against: readonly Against[]
}

/**
 * The chief lifts holds and recalls without a new look, and says why. What is still to be seen stays held by a hold of its own: the only way to make one narrower.
 * What was written stays until it is saved.
 */
export function LiftForm({ walk, against }: LiftFormProps) {
  const day = useDay()
  const [why, setWhy] = useState('')
  const [left, setLeft] = useState<readonly string[]>([])
  const [kept, setKept] = useState<readonly string[]>([])
  const { busy, problem, act } = useAction()
  const lifting = against.filter(({ hash }) => !left.includes(hash))
  const stations = [...new Set(lifting.flatMap(({ block }) => block?.stations ?? []))]
  const lift = async () => {
    const drafts = liftDrafts(
      walk,
      lifting,
      kept.filter((id) => stations.includes(id)),
      why.trim(),
    )
    if (!(await act(() => day.record(drafts)))) return
    setWhy('')
    setKept([])
  }
  return (
    <form
      className="grid gap-2 border-l-8 border-line bg-surface p-4"
      onSubmit={(event) => {
        event.preventDefault()
        void lift()
      }}
    >
      {against.length > 1 && (
        <fieldset>
          <legend className="font-bold">Which?</legend>
          {against.map((one) => (
            <Choice
              key={one.hash}
              checked={!left.includes(one.hash)}
              onChange={() => setLeft(left.includes(one.hash) ? left.filter((hash) => hash !== one.hash) : [...left, one.hash])}
            >
              {wordsHere(day, one, walk).what}
            </Choice>
          ))}
        </fieldset>
      )}
      <TextField
        label="Lift it without a new look, because"
        value={why}
        maxLength={500}
        minLength={3}
        required
        onChange={(event) => setWhy(event.target.value)}
      />
      {stations.length > 0 && (
        <StationPicks
          legend="Still to be seen: it stays held for these alone"
          stations={stations.map((id) => ({ id, title: walk.book?.stations.get(id)?.title ?? id }))}
          picked={kept}
          onPick={setKept}
        />
      )}
      <ProblemNotice problem={problem} />
      <Button type="submit" look="secondary" disabled={lifting.length === 0} isBusy={busy}>
        {kept.length > 0 ? 'Lift it, and hold it for less' : 'Lift the hold'}
      </Button>
    </form>
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
