'use client'

import { useEffect, useEffectEvent, type MouseEvent, type ReactNode } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { AnswerScreen } from '@/app/_ui/answer-screen'
import { Button } from '@/app/_ui/button'
import type { PitAnswer } from '@/lib/pass/pit-answer'
import { showTail } from '@/lib/pass/plate-tail'
import { keepScan } from './keep-scan'
import { PeopleAboard } from './people-aboard'
import type { Asked, Asking } from './use-asking'
import { vibrate } from './vibrate'

interface AnswerViewProps {
  readonly answer: PitAnswer
  readonly asked: Asked
  readonly asking: Asking
  readonly strip: ReactNode
  readonly held: ReactNode
  readonly onHold: (entry: string) => void
}

const SHAPES = { PASSED: 'ok', HOLD: 'fail', CHECK: 'ask' } as const

/** The answer, over everything: shape, word, number, why, what to do. A tap anywhere but on a button goes back to the camera. */
export function AnswerView({ answer, asked, asking, strip, held, onHold }: AnswerViewProps) {
  const day = useDay()
  const { entry } = answer
  useEffect(() => vibrate(answer.answer), [answer.answer, asked.ask])
  const keep = useEffectEvent(() => keepScan(localStorage, day.status(), asked, answer))
  // What was answered first is kept, and each time the answer changes while it stands: a tap on who is aboard, a hold made here.
  useEffect(() => keep(), [answer.answer, answer.code, asked])
  const state = stopsOf(answer) ? 'held' : SHAPES[answer.answer]
  const leave = (event: MouseEvent<HTMLElement>) => {
    if (event.target instanceof Element && event.target.closest('button, input, label') === null) asking.next()
  }
  return (
    <div
      className="fixed inset-0 z-10 mx-auto flex max-w-3xl flex-col overflow-y-auto bg-ground"
      onKeyDown={({ key }) => {
        if (key === 'Escape') asking.next()
      }}
    >
      {strip}
      <div className="flex grow flex-col" onClick={leave}>
        <AnswerScreen
          state={state}
          word={answer.answer}
          number={answer.number ?? (asked.typed === '' ? '–' : asked.typed)}
          lines={linesOf(answer)}
          foot={<Foot answer={answer} asked={asked} asking={asking} />}
        />
      </div>
      <div className="sticky bottom-0 border-t-[3px] bg-ground">
        <div className="grid grid-cols-[1fr_2fr] gap-4 p-3">
          <Button look="secondary" disabled={entry === null} onClick={entry === null ? undefined : () => onHold(entry)}>
            Hold {answer.number ?? 'it'}
          </Button>
          <Button size="large" autoFocus onClick={asking.next}>
            Next car
          </Button>
        </div>
        <div className="border-t">{held}</div>
      </div>
    </div>
  )
}

/** What stops the car itself, where that is among the reasons: it is what the driver has to be told, so it is said first. */
function stopsOf(answer: PitAnswer): PitAnswer['reasons'][number] | null {
  return answer.answer === 'HOLD' ? (answer.reasons.find(({ code }) => code === 'blocked') ?? null) : null
}

/** Of a car that may go, what to compare; of any other, why not. */
function linesOf(answer: PitAnswer): readonly string[] {
  if (answer.answer === 'PASSED') return compareLines(answer)
  return [...new Set([...(stopsOf(answer)?.why ?? []), ...answer.why])]
}

function compareLines({ plateTail, colour, model }: PitAnswer): readonly string[] {
  return [[showTail(plateTail ?? ''), colour ?? ''].filter(Boolean).join(' · '), model ?? ''].filter(Boolean)
}

function Foot({ answer, asked, asking }: Pick<AnswerViewProps, 'answer' | 'asked' | 'asking'>) {
  return (
    <div className="grid gap-2">
      <p className="text-xl font-bold">{stopsOf(answer)?.todo ?? answer.todo}</p>
      {answer.answer !== 'PASSED' && <p>{compareLines(answer).join(' · ')}</p>}
      {/* Of a car that stays, nobody reads that somebody may drive; but who was tapped aboard by mistake can be tapped anew. */}
      {(answer.answer !== 'HOLD' || asked.aboard !== null) && (
        <PeopleAboard answer={answer} aboard={asked.aboard} onAboard={asking.setAboard} />
      )}
      {answer.passengerSeatUsable !== null && answer.answer !== 'HOLD' && (
        <p>{answer.passengerSeatUsable ? 'passenger seat usable' : 'no passenger: the seat was not passed for one'}</p>
      )}
    </div>
  )
}
