import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { PageFrame } from '@/app/_ui/page-frame'
import { pageAccount } from '@/lib/http/page-account'
import { PlainBar } from '../_frame/plain-bar'

export const metadata: Metadata = { title: 'For entrants' }

/** Says what there is for an entrant today, and what there is not. */
export default async function EntrantPage() {
  const account = await pageAccount()
  if (!account) redirect('/sign-in?next=/entrant')
  return (
    <PageFrame title="Nothing to fill in yet" subtitle={account.name} width="text" navigation={<PlainBar />}>
      <div className="grid max-w-prose gap-4">
        <p>
          Declaring your car, your changes and your kit before the event is not part of Lockwire yet, and no list of your entries either.
        </p>
        <p>
          On the day, bring the car to the bay with its papers. What was not passed is told you there with the reason. Anybody can scan the
          sticker on the car to see whether its pass is valid that day.
        </p>
      </div>
    </PageFrame>
  )
}
