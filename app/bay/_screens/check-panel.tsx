'use client'

import { AnswerButtons } from './answer-buttons'
import { JudgementLine } from './judgement-line'
import { MeasureFields } from './measure-fields'
import { MendedButtons } from './mended-buttons'
import { ReasonSheet } from './reason-sheet'
import { useCheck, type CheckInput } from './use-check'

const SHEET_TITLES = { fail: 'What is not so?', advisory: 'What should the driver know?', 'put-right': 'What was put right?' } as const

/** One check: what to look at, the values judged as they are typed, and the answers. */
export function CheckPanel({ busy, ...input }: CheckInput & { readonly busy: boolean }) {
  const now = useCheck(input)
  const { check } = input.item
  const { typed, mending } = input.entered
  return (
    <section className="flex grow flex-col" aria-labelledby="check-prompt">
      <h3 id="check-prompt" className="mt-2 text-xl">
        {check.prompt}
      </h3>
      <p className="mt-2 text-muted">{check.how}</p>
      {mending && (
        <p role="status" className="mt-3 border-l-4 border-accent pl-3 font-bold">
          Put right here: take it anew as it is now.
        </p>
      )}
      {check.measure ? (
        <MeasureFields
          // What is taken anew begins with an empty keypad.
          key={mending ? 'anew' : 'met'}
          fields={check.measure}
          typed={typed}
          onTyped={(next) => input.setEntered({ typed: next, mending })}
          problems={now.problems}
          judgement={now.judgement}
          source={check.source}
        />
      ) : (
        <JudgementLine judgement={now.judgement} source={check.source} />
      )}
      {mending ? <MendedButtons now={now} busy={busy} /> : <AnswerButtons now={now} busy={busy} />}
      {now.asking && (
        <ReasonSheet
          check={check}
          title={SHEET_TITLES[now.asking]}
          note={now.note}
          onNote={now.setNote}
          onReason={now.give}
          onClose={() => now.ask(null)}
        />
      )}
    </section>
  )
}
