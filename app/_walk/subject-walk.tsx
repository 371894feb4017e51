'use client'

import { useState } from 'react'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { Notice } from '@/app/_ui/notice'
import { UndoBar } from '@/app/_ui/undo-bar'
import type { CarFacts } from '@/lib/checklist/car-facts'
import { judgedKind } from '@/lib/inspection/subject'
import { BlockList } from './block-list'
import { ForTheChief } from './for-the-chief'
import { openStop } from './open-stop'
import { Presenting } from './presenting'
import type { Undo } from './use-undo'
import type { Walk } from './use-walk'
import { WalkHead } from './walk-head'
import { WalkOverview } from './walk-overview'

interface SubjectWalkProps {
  readonly walk: Walk
  /** Address of this subject's walk; its places stand below it. */
  readonly base: string
  /** What is known of it before anybody presents it. */
  readonly told: CarFacts
  readonly undo: Undo
}

/** One subject's walk from above: the wire, the verdict, what is open, where to go on, and the pass or band when it is earned. */
export function SubjectWalk({ walk, base, told, undo }: SubjectWalkProps) {
  const { book, state } = walk
  // Somebody told of at a briefing has not said yet what they wear: that is asked before the walk goes on.
  const [changing, setChanging] = useState(() => lacksFacts(walk))
  if (!book)
    return (
      <Notice
        happened="The checklist this walk needs is not on this device."
        kept="Nothing was lost."
        todo="Load the day again where there is signal."
        className="m-4"
      />
    )
  const takeBack = () => {
    void undo.takeBack().then((back) => {
      if (back) openStop(walk.subject, base, back)
    })
  }
  const isPresented = state.presentedHeads.length > 0
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4 px-4 pt-3 pb-6">
      <WalkHead walk={walk} book={book} base={base} />
      <BlockList walk={walk} />
      {isPresented && !changing ? (
        <WalkOverview walk={walk} base={base} onChange={() => setChanging(true)} />
      ) : (
        <Presenting walk={walk} book={book} told={told} onDone={isPresented ? () => setChanging(false) : null} />
      )}
      <ForTheChief walk={walk} />
      <ProblemNotice problem={undo.problem} />
      {undo.done !== null && <UndoBar done={undo.done} onUndo={takeBack} />}
    </div>
  )
}

/** Whether the facts that are pinned of a person leave out one that the checklist asks. */
function lacksFacts({ subject, book, facts }: Walk): boolean {
  if (judgedKind(subject) !== 'person' || book === null || facts === null) return false
  return book.checklist.facts.some(({ name, subject: kind }) => kind === 'person' && (facts[name] ?? null) === null)
}
