'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { sayDue } from '@/app/_crew/day-switches'
import { recallWith } from '@/app/_crew/hold-drafts'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { useMinute } from '@/app/_crew/use-minute'
import { Button } from '@/app/_ui/button'
import { holdRow } from '@/lib/checklist/resolve-hold'
import { isKnown } from '@/lib/inspection/record'
import type { Against } from '@/lib/inspection/stands-against'
import { can } from '@/lib/permissions/policy'
import { triggerWords } from '@/lib/pass/trigger-words'
import { wordsHere } from './words-here'
import type { Walk } from './use-walk'
import { WidenSheet } from './widen-sheet'

interface AgainstLineProps {
  readonly against: Against
  readonly walk: Walk
  /** A recall that only this device's clock calls due. */
  readonly isByClock: boolean
}

/** One hold or recall: why, since when, by whom, what to see again; a hold can be made wider here. */
export function AgainstLine({ against, walk, isByClock }: AgainstLineProps) {
  const day = useDay()
  const [isWidening, setWidening] = useState(false)
  const words = wordsHere(day, against, walk)
  const { block, record, kind } = against
  const onlyChief = block?.onlyChiefLifts === true
  return (
    <li className="grid gap-1">
      <p>
        <span className="font-bold">{words.what}</span>, {words.since}
      </p>
      {onlyChief && <p>Nothing that is seen again ends it: only the chief lifts it.</p>}
      {words.seeAgain.length > 0 && <p>See again: {words.seeAgain.join(', ')}</p>}
      {words.alsoLook.length > 0 && <p>Look by eye as well, since the checklist has nothing for it: {words.alsoLook.join(', ')}.</p>}
      {words.warning !== null && <p className="font-bold">{words.warning}</p>}
      {block?.stickerRemoved === false && <p>The sticker was left on: take it off.</p>}
      {isByClock && <DueByClock against={against} />}
      {kind === 'hold' && isKnown(record) && record.kind === 'hold' && !onlyChief && (
        <Button look="quiet" className="justify-self-start" onClick={() => setWidening(true)}>
          More is to be seen
        </Button>
      )}
      {kind === 'hold' && <RecallThatComesWith against={against} walk={walk} />}
      {isWidening && isKnown(record) && record.kind === 'hold' && (
        <WidenSheet hold={record} walk={walk} onClose={() => setWidening(false)} />
      )}
    </li>
  )
}

/** Due by the clock of this device: somebody who may must say so, and only then can a look end it. */
function DueByClock({ against: { record } }: { readonly against: Against }) {
  const day = useDay()
  const { busy, problem, act } = useAction()
  const snapshot = day.snapshot()
  if (!isKnown(record) || record.kind !== 'recall' || snapshot === null) return null
  const maySay = can(day.status().unlocked?.roles ?? [], 'record:day')
  return (
    <>
      <p className="font-bold">Due by this device’s clock.</p>
      <ProblemNotice problem={problem} />
      {maySay ? (
        <Button look="secondary" className="justify-self-start" isBusy={busy} onClick={() => void act(() => sayDue(day, record.trigger))}>
          Due {triggerWords(record.trigger, snapshot)}: say so
        </Button>
      ) : (
        <p>The pit exit or the chief has to say so; from then on a look here ends it.</p>
      )}
    </>
  )
}

/** A hold of this reason brings a recall: whoever held it could not make one, so it is made here. */
function RecallThatComesWith({ against, walk }: Pick<AgainstLineProps, 'against' | 'walk'>) {
  const day = useDay()
  const now = useMinute()
  const { busy, problem, act } = useAction()
  const { record, at } = against
  const entry = 'car' in walk.subject ? day.entry(walk.subject.car) : null
  const row = isKnown(record) && record.kind === 'hold' ? holdRow(record.reason, walk.book) : null
  if (entry === null || row === null || now === null) return null
  const recalls = recallWith(day, { entry, row, now })
  const isMade = day
    .log(walk.state.key)
    .some((one) => isKnown(one.record) && one.record.kind === 'recall' && one.record.at + one.record.offset >= at)
  const [recall] = recalls
  const snapshot = day.snapshot()
  if (recall === undefined || snapshot === null || isMade) return null
  return (
    <>
      <ProblemNotice problem={problem} />
      <Button look="secondary" className="justify-self-start" isBusy={busy} onClick={() => void act(() => day.record(recalls))}>
        Recall it {triggerWords(recall.trigger, snapshot)}, as belongs to it
      </Button>
    </>
  )
}
