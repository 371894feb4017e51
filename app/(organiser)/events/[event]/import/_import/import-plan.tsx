import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { ImportColumns } from './import-columns'
import { ImportCounts } from './import-counts'
import { ImportProblems } from './import-problems'
import { ImportQuestions } from './import-questions'
import { entriesInWords, type ImportAnswer } from './import-words'
import type { ChosenList } from './read-file'
import type { ImportDesk } from './use-import'

interface ImportPlanProps {
  readonly desk: ImportDesk
  readonly list: ChosenList
  readonly plan: ImportAnswer
  readonly isBusy: boolean
}

/** What importing the list would do, what has to be said about it first, and the one button that does it. With a problem there is no button: all rows or none. */
export function ImportPlan({ desk, list, plan, isBusy }: ImportPlanProps) {
  return (
    <div className="grid gap-8" aria-busy={isBusy || undefined}>
      <ImportCounts list={list} plan={plan} />
      {/* Another heading row or writing gives other columns: what was typed for the old ones goes with them. */}
      <ImportColumns key={`${plan.encoding ?? ''} ${plan.headingRow}`} desk={desk} plan={plan} />
      {plan.problemCount > 0 && (
        <>
          <Notice
            happened={`${plan.problemCount === 1 ? '1 problem' : `${plan.problemCount} problems`} in ${list.fileName}: nothing can be imported yet.`}
            kept="Nothing was imported. A list goes in whole or not at all."
            todo="Put the cells right here, leave rows out, or put them right in your list and choose it again."
          />
          <ImportProblems desk={desk} list={list} plan={plan} />
        </>
      )}
      {plan.questions.length > 0 && <ImportQuestions desk={desk} plan={plan} />}
      <Remarks plan={plan} />
      <LastStep desk={desk} list={list} plan={plan} isBusy={isBusy} />
    </div>
  )
}

function LastStep({ desk, list, plan, isBusy }: ImportPlanProps) {
  const touched = plan.added + plan.changed
  if (desk.isChanged)
    return (
      <div className="sticky bottom-0 flex flex-wrap items-center gap-4 border-t-2 bg-ground py-3">
        <Button isBusy={isBusy} onClick={desk.again}>
          Look it through with these answers
        </Button>
        <p>Nothing is written by it.</p>
      </div>
    )
  if (plan.columnsNeeded || plan.problemCount > 0 || plan.openQuestions > 0) return null
  if (touched === 0) return <Notice weight="news" happened="Nothing to import: every entry of this list is here as it stands in it." />
  return (
    <div>
      <Button isBusy={isBusy} onClick={() => void desk.commit(list, plan)}>
        Import {entriesInWords(touched)}
      </Button>
    </div>
  )
}

function Remarks({ plan: { remarks, remarkCount } }: { readonly plan: ImportAnswer }) {
  if (remarks.length === 0) return null
  return (
    <section aria-labelledby="remarks">
      <h2 id="remarks" className="text-2xl">
        Also noticed
      </h2>
      <ul className="mt-2 grid gap-1">
        {remarks.slice(0, 50).map(({ row, words }) => (
          <li key={`${row} ${words}`}>
            <span className="font-bold">Row {row}:</span> {words}
          </li>
        ))}
      </ul>
      {remarkCount > 50 && <p className="mt-1 text-muted">and {remarkCount - 50} more of the kind.</p>}
    </section>
  )
}
