import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { PRE_CHECKS } from '@/lib/checklist/pre-check'
import type { DeclaredItem } from '@/lib/entrants/declared-items'
import { PRE_CHECK_SHAPES } from '@/app/(entrant)/_answers/pre-check-shapes'

/** What it all comes to, as declared, in the bay's words; nothing is passed here. */
export function SumSection({ items }: { readonly items: readonly DeclaredItem[] }) {
  const counted = items.filter(({ kind, preCheck }) => kind === 'label' || preCheck !== 'not answered')
  const fails = counted.filter(({ preCheck }) => preCheck === 'would not be passed')
  return (
    <div className="grid gap-3">
      <ul aria-label="As declared" className="grid gap-1">
        {PRE_CHECKS.map((says) => {
          const count = counted.filter(({ preCheck }) => preCheck === says).length
          return count === 0 ? null : (
            <li key={says} className="flex items-center gap-3">
              <OutcomeShape state={PRE_CHECK_SHAPES[says]} className="size-6" />
              <span>
                <strong className="tabular-nums">{count}</strong> {says}
              </span>
            </li>
          )
        })}
      </ul>
      {fails.length > 0 && (
        <p className="font-bold">
          Would not be passed: {fails.map(({ check }) => check.short).join(', ')}. You may sign and mend it before the day.
        </p>
      )}
      <p className="text-muted">
        Nothing is passed here, whatever is declared: somebody competent looks at the car and at the kit on the day.
      </p>
    </div>
  )
}
