'use client'

import { useState } from 'react'
import type { CarFacts } from '@/lib/checklist/car-facts'
import { judgeCheck } from '@/lib/checklist/judge-check'
import { civilDate } from '@/lib/rules/civil-date'
import { explainJudgement } from '@/lib/rules/explain'
import type { Answer } from '@/lib/walk/answer'
import { readValues, type Typed } from '@/lib/walk/read-values'
import type { WalkItem } from '@/lib/walk/walk-plan'
import { Button } from '@/app/_ui/button'
import { OutcomeButton } from '@/app/_ui/outcome-button'
import { JudgementLine } from './judgement-line'
import { MeasureFields } from './measure-fields'
import { ReasonSheet, type ReasonGiven } from './reason-sheet'

interface CheckPanelProps {
  readonly item: WalkItem
  readonly facts: CarFacts
  /** The event's last day: dated kit is judged on it. */
  readonly lastDay: string
  readonly typed: Typed
  readonly onTyped: (typed: Typed) => void
  readonly onAnswer: (answer: Answer, note: string) => void
  readonly busy: boolean
}

/** What a reason is being asked for. */
type Asking = { readonly for: 'fail' | 'advisory' } | { readonly for: 'put-right' } | null

/** One check: what to look at, the values judged as they are typed, and the answers. The judgement proposes, the person decides, never milder. */
export function CheckPanel({ item, facts, lastDay, typed, onTyped, onAnswer, busy }: CheckPanelProps) {
  const { check } = item
  const [asking, setAsking] = useState<Asking>(null)
  const [found, setFound] = useState<{ readonly values: Answer & { say: 'put-right' }; readonly note: string } | null>(null)
  const read = readValues(check.measure ?? [], typed)
  const judgement = read.problems.length > 0 ? null : judgeCheck(check, read.values, facts, civilDate(lastDay))
  const says = check.rule ? (judgement?.outcome ?? 'undecided') : 'ok'

  const give = (reason: ReasonGiven) => {
    setAsking(null)
    if (asking === null) return
    if (asking.for !== 'put-right') {
      onAnswer({ say: asking.for, values: read.values, reason: reason.id }, reason.note)
      return
    }
    const mended: Answer & { say: 'put-right' } = { say: 'put-right', found: { values: read.values, reason: reason.id }, values: {} }
    if (check.rule) {
      // What was measured is the state met; the state left is measured anew.
      setFound({ values: mended, note: reason.note })
      onTyped({})
    } else onAnswer(mended, reason.note)
  }

  const answerGood = (say: 'ok' | 'advisory') => {
    if (found) onAnswer({ ...found.values, values: read.values }, found.note)
    else if (say === 'ok') onAnswer({ say, values: read.values }, '')
    else setAsking({ for: 'advisory' })
  }

  return (
    <section className="flex grow flex-col" aria-labelledby="check-prompt">
      <h3 id="check-prompt" className="mt-2 text-xl">
        {check.prompt}
      </h3>
      <p className="mt-2 text-muted">{check.how}</p>
      {found && <p className="mt-3 border-l-4 border-accent pl-3 font-bold">Put right here: take it anew as it is now.</p>}
      {check.measure && <MeasureFields fields={check.measure} typed={typed} onTyped={onTyped} judgement={judgement} />}
      {read.problems.map((problem) => (
        <p key={problem.field} role="alert" className="mt-2 font-bold">
          {problem.why}
        </p>
      ))}
      {judgement && (
        <JudgementLine outcome={judgement.outcome} words={explainJudgement(judgement.code, judgement.facts)} source={check.source} />
      )}
      <div className="mt-auto grid grid-cols-2 gap-x-12 gap-y-4 pt-5">
        {says === 'advisory' ? (
          <OutcomeButton state="advisory" disabled={busy} onClick={() => answerGood('advisory')}>
            {found ? 'Seen again, with a note' : 'May run, with a note'}
          </OutcomeButton>
        ) : (
          <OutcomeButton state="ok" disabled={busy || says !== 'ok'} onClick={() => answerGood('ok')}>
            {found ? 'Seen again, right' : 'Seen so'}
          </OutcomeButton>
        )}
        <OutcomeButton state="fail" disabled={busy || found !== null} onClick={() => setAsking({ for: 'fail' })}>
          Not so
        </OutcomeButton>
      </div>
      <div className="grid grid-cols-3 gap-3 pt-4">
        <Button look="secondary" size="large" disabled={busy || found !== null} onClick={() => setAsking({ for: 'put-right' })}>
          Put right here
        </Button>
        <Button
          look="secondary"
          size="large"
          disabled={busy || found !== null || says === 'fail'}
          onClick={() => setAsking({ for: 'advisory' })}
        >
          Advisory
        </Button>
        <Button look="secondary" size="large" disabled={busy || found !== null} onClick={() => onAnswer({ say: 'could-not-see' }, '')}>
          Could not see
        </Button>
      </div>
      {asking && <ReasonSheet check={check} title={SHEET_TITLES[asking.for]} onReason={give} onClose={() => setAsking(null)} />}
    </section>
  )
}

const SHEET_TITLES = { fail: 'What is not so?', advisory: 'What should the driver know?', 'put-right': 'What was put right?' } as const
