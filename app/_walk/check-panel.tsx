'use client'

import { useTaking } from '@/app/_crew/use-taking'
import { AnswerButtons } from './answer-buttons'
import { CheckPhotos } from './check-photos'
import { JudgementLine } from './judgement-line'
import { MeasureFields } from './measure-fields'
import { MendedButtons } from './mended-buttons'
import { PhotoSheet } from './photo-sheet'
import { ReasonSheet } from './reason-sheet'
import { useCheck, type CheckInput } from './use-check'

const SHEET_TITLES = { fail: 'What is not so?', advisory: 'What should the driver know?', 'put-right': 'What was put right?' } as const

/** One check: what to look at, the values judged as they are typed, and the answers. */
export function CheckPanel({ busy, ...input }: CheckInput & { readonly busy: boolean }) {
  const now = useCheck(input)
  const { check } = input.item
  const { typed, mending, photos } = input.entered
  const taking = useTaking()
  const isBusy = busy || taking.busy
  const setPhotos = (next: readonly string[]) => input.setEntered({ typed, mending, photos: next })
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
          onTyped={(next) => input.setEntered({ typed: next, mending, photos })}
          problems={now.problems}
          judgement={now.judgement}
          source={check.source}
        />
      ) : (
        <JudgementLine judgement={now.judgement} source={check.source} />
      )}
      <CheckPhotos
        words={check.short}
        photos={photos}
        taking={taking}
        disabled={busy}
        onPhotos={setPhotos}
        onRemove={(hash) => {
          setPhotos(photos.filter((one) => one !== hash))
          taking.drop(hash)
        }}
      />
      {mending ? <MendedButtons now={now} busy={isBusy} /> : <AnswerButtons now={now} busy={isBusy} />}
      {now.photoAsked && <PhotoSheet short={check.short} taking={taking} {...now.photoAsked} />}
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
