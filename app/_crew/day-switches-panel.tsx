'use client'

import { useEffect, useRef, useState } from 'react'
import { Button } from '@/app/_ui/button'
import { triggerWords } from '@/lib/pass/trigger-words'
import { useDayVersion } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'
import { daySwitches, sayDue, saySessionOver, sayWet } from './day-switches'
import { ProblemNotice } from './problem-notice'
import { recallsHere } from './recalls-here'
import { clockTime } from './say-when'
import { useAction } from './use-action'
import { useMinute } from './use-minute'

interface Question {
  readonly id: string
  readonly ask: string
  readonly means: string
  readonly yes: string
  readonly say: () => Promise<unknown>
}

/** The switches of the whole day: wet, sessions that are over, recalls whose hour has come. Each asks once more, since none can be taken back. */
export function DaySwitchesPanel() {
  const day = useDay()
  useDayVersion(day)
  const clock = useMinute()
  const { busy, problem, act } = useAction()
  const [question, setQuestion] = useState<Question | null>(null)
  if (clock === null) return null
  const switches = daySwitches(day, clock)
  const zone = day.snapshot()?.event.timeZone ?? 'UTC'

  if (question !== null)
    return (
      <Asked
        question={question}
        busy={busy}
        problem={problem}
        onYes={() => void act(question.say).then((isDone) => (isDone ? setQuestion(null) : undefined))}
        onNo={() => setQuestion(null)}
      />
    )
  const questions = [
    wetQuestion(switches.isWet, () => sayWet(day, !switches.isWet)),
    ...switches.sessions.map(({ group, name, session }): Question => ({
      id: `session ${group}`,
      ask: `Is session ${session} of ${name} over?`,
      means: 'Every recall after it falls due, and its car is HOLD until it has been shown. It cannot be taken back.',
      yes: `Session ${session} of ${name} is over`,
      say: () => saySessionOver(day, { group, session }),
    })),
    ...recallsHere(day, clock)
      .filter(({ recall }) => recall.trigger.when === 'time')
      .map(({ hash, recall, since }): Question => ({
        id: hash,
        ask: `Has ${clockTime(since, zone)} come?`,
        means: 'A recall is due by this device’s clock. Said here, it is due for everybody, and can be seen and ended in the bay.',
        yes: `Due ${triggerWords(recall.trigger, { groups: [], event: { timeZone: zone } })}: say so`,
        say: () => sayDue(day, recall.trigger),
      })),
  ]
  const past = new Set(switches.sessions.filter(({ isPast }) => isPast).map(({ group }) => `session ${group}`))
  return (
    <section className="grid gap-3" aria-label="For the whole event">
      <p className="font-bold">
        {switches.wetSince === null ? 'Wet is not declared.' : `Wet since ${clockTime(switches.wetSince, zone)}.`}
      </p>
      {questions.map((one) => (
        <Button key={one.id} size="large" look="secondary" onClick={() => setQuestion(one)}>
          {one.yes}
          {past.has(one.id) && ' (past, by the timetable)'}
        </Button>
      ))}
    </section>
  )
}

interface AskedProps {
  readonly question: Question
  readonly busy: boolean
  readonly problem: ReturnType<typeof useAction>['problem']
  readonly onYes: () => void
  readonly onNo: () => void
}

/** Said once more before it is said to everybody: none of it can be taken back. */
function Asked({ question, busy, problem, onYes, onNo }: AskedProps) {
  const here = useRef<HTMLElement>(null)
  // It may stand below the edge of the sheet: whoever asked must see it.
  useEffect(() => here.current?.focus(), [])
  return (
    <section
      ref={here}
      tabIndex={-1}
      className="grid gap-3 border-l-8 border-accent bg-surface p-4 outline-none"
      aria-label="Say it for the whole event"
    >
      <p className="text-xl font-bold">{question.ask}</p>
      <p>{question.means}</p>
      <ProblemNotice problem={problem} />
      <Button look="secondary" onClick={onNo}>
        Not now
      </Button>
      <Button size="large" isBusy={busy} onClick={onYes}>
        {question.yes}
      </Button>
    </section>
  )
}

function wetQuestion(isWet: boolean, say: () => Promise<unknown>): Question {
  return isWet
    ? { id: 'wet', ask: 'Is it dry again?', means: 'Cars not yet seen for the wet are no longer held for it. Passes that died stay dead.', yes: 'Wet is over', say } // prettier-ignore
    : {
        id: 'wet',
        ask: 'Declare wet?',
        means:
          'Every car is held until its tyres, and whatever else the checklist tags wet, have been seen again. Passes issued before it die.',
        yes: 'Wet is declared',
        say,
      }
}
