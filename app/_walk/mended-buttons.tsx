import { Button } from '@/app/_ui/button'
import { OutcomeButton } from '@/app/_ui/outcome-button'
import type { CheckNow } from './use-check'

/** The answers once something was put right here: seen again, or it was not put right after all. */
export function MendedButtons({ now, busy }: { readonly now: CheckNow; readonly busy: boolean }) {
  const { says, agree, dropMending } = now
  return (
    <div className="mt-auto grid grid-cols-2 gap-x-12 gap-y-4 pt-5">
      {says === 'advisory' ? (
        <OutcomeButton state="advisory" disabled={busy} onClick={() => agree('advisory')}>
          Seen again, with a note
        </OutcomeButton>
      ) : (
        <OutcomeButton state="ok" disabled={busy || says !== 'ok'} onClick={() => agree('ok')}>
          Seen again, right
        </OutcomeButton>
      )}
      <Button look="secondary" size="large" disabled={busy} onClick={dropMending}>
        It was not put right
      </Button>
    </div>
  )
}
