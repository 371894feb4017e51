'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { OutcomeButton } from '@/app/_ui/outcome-button'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { closingSentence } from '@/lib/checklist/places'
import type { Answer } from '@/lib/walk/answer'
import type { WalkItem, WalkPlace } from '@/lib/walk/walk-plan'
import { ReasonSheet } from './reason-sheet'
import { stateOf } from './stop-picker'

interface ClosingPanelProps {
  readonly here: WalkPlace
  readonly busy: boolean
  readonly onClose: () => void
  readonly onPick: (check: string) => void
  readonly onAnswer: (item: WalkItem, answer: Answer, note: string) => void
}

/** The rest of a place: each thing to look at, and one answer that names them all. Whatever is not so is answered by itself. */
export function ClosingPanel({ here, busy, onClose, onAnswer }: ClosingPanelProps) {
  const [opened, setOpened] = useState<{ readonly item: WalkItem; readonly say: 'fail' | 'advisory' | 'put-right' } | null>(null)
  const open = here.together.filter((item) => !item.answered)
  const sentence = closingSentence(
    here.place,
    open.map(({ check }) => check),
  )
  return (
    <section className="flex grow flex-col" aria-label="The rest of this place">
      <ul className="mt-3 grid gap-3">
        {here.together.map((item) => (
          <li key={item.check.id} className="border-t border-line pt-2">
            <div className="flex items-start gap-3">
              <OutcomeShape state={stateOf(item)} className="mt-1 size-6" />
              <div className="grow">
                <p className="font-bold">{item.check.prompt}</p>
                <p className="text-muted">{item.check.how}</p>
              </div>
            </div>
            <div className="mt-1 flex flex-wrap gap-2">
              <Button look="secondary" disabled={busy} onClick={() => setOpened({ item, say: 'fail' })}>
                Not so
              </Button>
              <Button look="quiet" disabled={busy} onClick={() => setOpened({ item, say: 'put-right' })}>
                Put right here
              </Button>
              <Button look="quiet" disabled={busy} onClick={() => setOpened({ item, say: 'advisory' })}>
                Advisory
              </Button>
              <Button look="quiet" disabled={busy} onClick={() => onAnswer(item, { say: 'could-not-see' }, '')}>
                Could not see
              </Button>
            </div>
          </li>
        ))}
      </ul>
      <div className="mt-auto pt-5">
        {sentence === '' ? (
          <p className="font-bold">Everything here has been answered.</p>
        ) : (
          <OutcomeButton state="ok" disabled={busy} onClick={onClose} className="w-full">
            {sentence}
          </OutcomeButton>
        )}
      </div>
      {opened && (
        <ReasonSheet
          check={opened.item.check}
          title={
            opened.say === 'put-right' ? 'What was put right?' : opened.say === 'fail' ? 'What is not so?' : 'What should the driver know?'
          }
          onClose={() => setOpened(null)}
          onReason={({ id, note }) => {
            setOpened(null)
            const answer: Answer =
              opened.say === 'put-right'
                ? { say: 'put-right', found: { values: {}, reason: id }, values: {} }
                : { say: opened.say, values: {}, reason: id }
            onAnswer(opened.item, answer, note)
          }}
        />
      )}
    </section>
  )
}
