import type { ReactNode } from 'react'
import { NumberPlate } from './number-plate'
import { OutcomeShape, type OutcomeState } from './outcome-shape'

const FILLS = {
  ok: 'bg-ok text-ok-ink',
  fail: 'bg-fail text-fail-ink',
  held: 'bg-fail text-fail-ink',
  ask: 'bg-ask text-ask-ink',
} as const

export interface AnswerScreenProps {
  readonly state: Extract<OutcomeState, keyof typeof FILLS>
  /** The answer's word, in capitals: it is read from two metres at noon. */
  readonly word: string
  readonly number: string
  /** What to compare with the car, or why. */
  readonly lines: readonly string[]
  /** What to do, or who may go; at the lower edge. */
  readonly foot?: ReactNode
}

/** One answer that fills what it is given: shape, word, number, words. It appears at once, without motion. */
export function AnswerScreen({ state, word, number, lines, foot }: AnswerScreenProps) {
  return (
    <section
      data-slot="answer-screen"
      data-state={state}
      aria-live="assertive"
      className={`focus-on-fill flex grow flex-col gap-3 px-4 py-5 ${FILLS[state]}`}
    >
      <p className="flex items-center gap-3">
        <OutcomeShape state={state} tone="inverse" className="size-16 sm:size-20" />
        <span className="figures text-6xl">{word}</span>
      </p>
      <NumberPlate number={number} size="answer" className="py-2" />
      <div className="text-2xl font-bold">
        {lines.map((line) => (
          <p key={line}>{line}</p>
        ))}
      </div>
      {foot !== undefined && <div className="mt-auto pt-4 text-lg">{foot}</div>}
    </section>
  )
}
