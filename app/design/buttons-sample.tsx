import { Button } from '@/app/_ui/button'
import { OutcomeButton, OutcomePair } from '@/app/_ui/outcome-button'
import { Sample } from './sample'

/** Buttons and what records an outcome. */
export function ButtonsSample() {
  return (
    <Sample title="Buttons">
      <div className="flex flex-wrap gap-4">
        <Button>Issue the pass</Button>
        <Button look="secondary">Find a car</Button>
        <Button look="quiet">Undo</Button>
        <Button disabled>Not yet</Button>
        <Button isBusy>Sending</Button>
      </div>
      <Button size="large" className="max-w-[480px]">
        Close front left
      </Button>
      <div className="grid max-w-[480px] gap-4">
        <OutcomePair
          left={<OutcomeButton state="ok">3 mm or more</OutcomeButton>}
          right={<OutcomeButton state="fail">under 3 mm</OutcomeButton>}
        />
        <OutcomePair
          left={<OutcomeButton state="advisory">runs with a note</OutcomeButton>}
          right={<OutcomeButton state="ask">ask the chief</OutcomeButton>}
        />
        <OutcomePair
          left={
            <OutcomeButton state="ok" look="outlined">
              put right here
            </OutcomeButton>
          }
          right={
            <OutcomeButton state="ask" look="outlined">
              could not see
            </OutcomeButton>
          }
        />
        <OutcomePair
          left={
            <OutcomeButton state="ok" disabled>
              3 mm or more
            </OutcomeButton>
          }
          right={
            <OutcomeButton state="fail" disabled>
              under 3 mm
            </OutcomeButton>
          }
        />
      </div>
    </Sample>
  )
}
