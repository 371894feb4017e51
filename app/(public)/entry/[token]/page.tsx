import type { Metadata } from 'next'
import { PageFrame } from '@/app/_ui/page-frame'
import { describeEntryLink } from '@/lib/entrants/queries/find-entry-link'
import { pageAccount } from '@/lib/http/page-account'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { PlainBar } from '../../_frame/plain-bar'
import { LinkScreen } from './_link/link-screen'

// The address holds the secret: no search engine may keep it, and no page we link to may hear it.
export const metadata: Metadata = { title: 'Your entry', robots: { index: false, follow: false }, referrer: 'no-referrer' }

/** What a link from a mail opens. Looking does nothing: whoever scans mails opens every link in them. */
export default async function EntryLinkPage({ params }: { readonly params: Promise<{ token: string }> }) {
  const { token } = await params
  const shown = describeEntryLink(servedDatabase(), token, await pageAccount(), now())
  return (
    <PageFrame title="Your entry" width="text" navigation={<PlainBar />}>
      <LinkScreen token={token} shown={shown} />
    </PageFrame>
  )
}
