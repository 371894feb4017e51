import { OutcomeButton } from '@/app/_ui/outcome-button'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { closingSentence } from '@/lib/checklist/places'
import type { WalkPlace } from '@/lib/walk/walk-plan'
import { STATE_WORDS, stateOf } from './stop-picker'

interface ClosingPanelProps {
  readonly here: WalkPlace
  readonly busy: boolean
  readonly onClose: () => void
  /** One of them is not so: it is answered by itself. */
  readonly onPick: (check: string) => void
}

/** The rest of a place: each thing to look at, and one answer that names them all. Pressing one of them answers it by itself. */
export function ClosingPanel({ here, busy, onClose, onPick }: ClosingPanelProps) {
  const open = here.together.filter((item) => !item.answered)
  const sentence = closingSentence(
    here.place,
    open.map(({ check }) => check),
  )
  return (
    <section className="flex grow flex-col" aria-label="The rest of this place">
      <p className="mt-3 text-muted">Press what is not so, or could not be seen. One answer below closes the rest.</p>
      <ul className="mt-2">
        {here.together.map((item) => (
          <li key={item.check.id} className="border-t border-line">
            <button
              type="button"
              disabled={busy}
              onClick={() => onPick(item.check.id)}
              className="target flex w-full items-start gap-3 py-3 text-left active:bg-surface"
            >
              <OutcomeShape state={stateOf(item)} className="mt-1 size-6" label={STATE_WORDS[stateOf(item)]} />
              <span>
                <span className="font-bold">{item.check.prompt}</span>
                {item.seeAgain && <span className="block font-bold">See again</span>}
                <span className="block text-muted">{item.check.how}</span>
              </span>
            </button>
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
    </section>
  )
}
