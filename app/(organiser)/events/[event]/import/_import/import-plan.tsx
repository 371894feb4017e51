import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { ImportCounts } from './import-counts'
import { ImportProblems } from './import-problems'
import type { ChosenList, ImportAnswer } from './use-import'

interface ImportPlanProps {
  readonly list: ChosenList
  readonly plan: ImportAnswer
  readonly isBusy: boolean
  readonly onCommit: () => void
}

/** What importing the list would do, and the one button that does it. With a problem there is no button: all rows or none. */
export function ImportPlan({ list, plan, isBusy, onCommit }: ImportPlanProps) {
  const touched = plan.added + plan.changed
  return (
    <div className="grid gap-6">
      <ImportCounts list={list} plan={plan} />
      {plan.problemCount > 0 ? (
        <>
          <Notice
            happened={`${plan.problemCount === 1 ? '1 problem' : `${plan.problemCount} problems`} in ${list.fileName}: nothing can be imported yet.`}
            kept="Nothing was imported. A list goes in whole or not at all."
            todo="Put these right in your list and choose it again."
          />
          <ImportProblems plan={plan} />
        </>
      ) : touched === 0 ? (
        <Notice weight="news" happened="Nothing to import: every entry of this list is here as it stands in it." />
      ) : (
        <div>
          <Button isBusy={isBusy} onClick={onCommit}>
            Import {touched === 1 ? '1 entry' : `${touched} entries`}
          </Button>
        </div>
      )}
    </div>
  )
}
