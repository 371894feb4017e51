import type { Source, JudgementOutcome } from '@/lib/rules/judgement'
import { OutcomeShape } from '@/app/_ui/outcome-shape'

interface JudgementLineProps {
  readonly outcome: JudgementOutcome
  readonly words: string
  readonly source: readonly SourceShown[] | undefined
}

type SourceShown = Pick<Source, 'title' | 'confidence'> & { readonly edition?: string | undefined; readonly where?: string | undefined }

const SHAPES = { ok: 'ok', advisory: 'advisory', fail: 'fail', undecided: 'none' } as const

/** What the rule says as the values stand: the figure, the limit, and where the limit comes from. */
export function JudgementLine({ outcome, words, source }: JudgementLineProps) {
  return (
    <div role="status" aria-live="polite" className="mt-3 flex items-start gap-3">
      <OutcomeShape state={SHAPES[outcome]} className="mt-1 size-7" />
      <div>
        <p className="font-bold">{words}</p>
        {source && source.length > 0 && (
          <details className="text-muted">
            <summary className="target flex items-center underline">where the limit comes from</summary>
            <ul className="ml-5 list-disc">
              {source.map((one) => (
                <li key={`${one.title} ${one.where ?? ''}`}>
                  {[one.title, one.edition, one.where].filter(Boolean).join(', ')} ({one.confidence})
                </li>
              ))}
            </ul>
          </details>
        )}
      </div>
    </div>
  )
}
