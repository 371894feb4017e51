'use client'

import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import type { Book } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { Depth } from '@/lib/checklist/checklist'
import { judgedKind } from '@/lib/inspection/subject'
import type { DayProblem } from '@/lib/sync/client/day-problem'
import { FactsForm } from './facts-form'
import type { Walk } from './use-walk'

/** A fit is asked by what the car is: nothing of its own has to be said first. */
const HEADINGS = { car: 'What stands before you', person: 'Who stands before you', fit: 'In the seat, belts tight, helmet on' } as const

interface PresentingProps {
  readonly walk: Walk
  readonly book: Book
  readonly told: CarFacts
  /** Back to the walk; null before there is one. */
  readonly onDone: (() => void) | null
}

/** Says what stands there, which decides what is asked; and says it anew when it was not so. */
export function Presenting({ walk, book, told, onDone }: PresentingProps) {
  const day = useDay()
  const { busy, problem, act } = useAction()
  const { subject } = walk
  const event = day.snapshot()?.event
  const present = async (facts: CarFacts, depth: Depth) => {
    if (!event) return
    const declaration = ('car' in subject ? day.entry(subject.car)?.declaration : null) ?? null
    const pins = { checklist: event.checklistHash, limits: event.limitsHash, declaration }
    if (await act(() => day.record([{ kind: 'presented', subject, ...pins, facts, depth }]))) onDone?.()
  }
  const kind = judgedKind(subject)
  return (
    <section className="grid gap-3">
      <h2 className="text-lg">{HEADINGS[kind]}</h2>
      {kind === 'fit' ? (
        <Button size="large" isBusy={busy} onClick={() => void present(told, event?.defaultDepth ?? 'standard')}>
          Begin
        </Button>
      ) : (
        <FactsForm
          book={book}
          kind={kind}
          known={walk.facts ?? told}
          depth={walk.depth ?? event?.defaultDepth ?? 'standard'}
          busy={busy}
          onPresent={(facts, depth) => void present(facts, depth)}
        />
      )}
      <ProblemNotice problem={problem && wordsFor(problem, onDone !== null)} />
      {onDone && (
        <Button look="quiet" className="justify-self-start" onClick={onDone}>
          Leave it as it was
        </Button>
      )}
    </section>
  )
}

/** To look less deep, or to take back a fact, is a scrutineer's act (rule F12): who may not is told so, and not only that they may not. */
function wordsFor(problem: DayProblem, isChange: boolean): DayProblem {
  if (problem.code !== 'not-allowed' || !isChange) return problem
  return {
    code: 'not-allowed',
    what: 'Only a scrutineer may look less deep, or take back what was said of it.',
    kept: 'Nothing was changed; the walk goes on as it was.',
    todo: 'Ask a scrutineer to say it, or choose what asks more.',
  }
}
