import { explainJudgement } from '@/lib/rules/explain'
import type { Judgement, Source } from '@/lib/rules/judgement'
import { OutcomeShape } from '@/app/_ui/outcome-shape'

interface JudgementLineProps {
  /** Null while there is nothing to say. */
  readonly judgement: Judgement | null
  readonly source: readonly SourceShown[] | undefined
}

export type SourceShown = Pick<Source, 'title' | 'confidence'> & {
  readonly edition?: string | undefined
  readonly where?: string | undefined
}

const SHAPES = { ok: 'ok', advisory: 'advisory', fail: 'fail', undecided: 'none' } as const

/** What the rule says as the values stand: the figure, the limit, and where the limit comes from. */
export function JudgementLine({ judgement, source = [] }: JudgementLineProps) {
  return (
    <div className="mt-1">
      {/* Always there, so that what comes to stand in it is read out. */}
      <div role="status">
        {judgement && (
          <p className="flex items-start gap-3 font-bold">
            <OutcomeShape state={SHAPES[judgement.outcome]} className="size-7" />
            {explainJudgement(judgement.code, judgement.facts)}
          </p>
        )}
      </div>
      {judgement && source.length > 0 && (
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
  )
}
