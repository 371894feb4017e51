import { OutcomeShape, type OutcomeState } from '@/app/_ui/outcome-shape'
import { Sample } from './sample'

const OUTCOMES: readonly (readonly [OutcomeState, string, string])[] = [
  ['ok', 'ok', 'bg-ok text-ok-ink'],
  ['advisory', 'advisory', 'bg-advisory text-advisory-ink'],
  ['fail', 'fail', 'bg-fail text-fail-ink'],
  ['held', 'held', 'bg-fail text-fail-ink'],
  ['ask', 'could not see', 'bg-ask text-ask-ink'],
  ['na', 'does not apply', 'bg-ground text-ink'],
  ['none', 'not seen yet', 'bg-ground text-muted'],
]

/** The shapes on the ground and on their own colour. */
export function OutcomesSample() {
  return (
    <Sample title="Outcomes">
      <ul className="grid grid-cols-[repeat(auto-fill,minmax(160px,1fr))] gap-3">
        {OUTCOMES.map(([state, word, fill]) => (
          <li key={state} className="grid border">
            <span className="flex items-center gap-3 p-3">
              <OutcomeShape state={state} className="size-10" />
              <OutcomeShape state={state} className="size-5" />
            </span>
            <span className={`flex items-center gap-2 p-3 font-bold ${fill}`}>
              <OutcomeShape state={state} tone="inverse" className="size-7" />
              {word}
            </span>
          </li>
        ))}
      </ul>
    </Sample>
  )
}
