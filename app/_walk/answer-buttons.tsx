import { Button } from '@/app/_ui/button'
import { OutcomeButton } from '@/app/_ui/outcome-button'
import type { CheckNow } from './use-check'

/** The answers of a check. The two opposite ones never change sides; what the values rule out cannot be pressed. */
export function AnswerButtons({ now, busy }: { readonly now: CheckNow; readonly busy: boolean }) {
  const { says, ask, agree } = now
  return (
    <>
      <div className="mt-auto grid grid-cols-2 gap-x-12 gap-y-4 pt-5">
        {says === 'advisory' ? (
          <OutcomeButton state="advisory" disabled={busy} onClick={() => agree('advisory')}>
            May run, with a note
          </OutcomeButton>
        ) : (
          <OutcomeButton state="ok" disabled={busy || says !== 'ok'} onClick={() => agree('ok')}>
            Seen so
          </OutcomeButton>
        )}
        <OutcomeButton state="fail" disabled={busy} onClick={() => ask('fail')}>
          Not so
        </OutcomeButton>
      </div>
      <div className="grid grid-cols-3 gap-3 pt-4">
        <Button look="secondary" size="large" disabled={busy} onClick={() => ask('put-right')}>
          Put right here
        </Button>
        <Button look="secondary" size="large" disabled={busy || says === 'fail' || says === 'undecided'} onClick={() => ask('advisory')}>
          Advisory
        </Button>
        <Button look="secondary" size="large" disabled={busy} onClick={now.couldNotSee}>
          Could not see
        </Button>
      </div>
    </>
  )
}
