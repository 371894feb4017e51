import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { BookCheck } from '@/lib/checklist/book'
import type { PreChecked } from '@/lib/checklist/pre-check'
import { bringWords } from '@/lib/entrants/bring-words'
import { explainJudgement } from '@/lib/rules/explain'
import { PRE_CHECK_SHAPES } from './pre-check-shapes'
import { Sources } from './sources'

interface PreCheckLineProps extends PreChecked {
  readonly check: Pick<BookCheck, 'rule' | 'source'>
  /** Nothing was said yet: no word is needed. */
  readonly isEmpty: boolean
  /** Where the same question stands several times, its sources are shown once. */
  readonly hidesSource?: boolean
}

/** What the bay’s rule makes of an answer, at once: the word, the figure that decided with its limit, what to bring, where the limit comes from. */
export function PreCheckLine({ check, preCheck, judgement, isEmpty, hidesSource = false }: PreCheckLineProps) {
  return (
    <div>
      {/* Always there, so that what comes to stand in it is read out. */}
      <div role="status">
        {!isEmpty && (
          <div className="flex items-start gap-3">
            <OutcomeShape state={PRE_CHECK_SHAPES[preCheck]} className="mt-0.5 size-7" />
            <div>
              <p>
                <strong>As declared: {preCheck}.</strong>
                {judgement && ` ${explainJudgement(judgement.code, judgement.facts)}`}
              </p>
              {preCheck === 'would not be passed' && <p>{bringWords(check.rule?.name)}</p>}
            </div>
          </div>
        )}
      </div>
      {!isEmpty && !hidesSource && judgement && <Sources source={check.source ?? []} />}
    </div>
  )
}
