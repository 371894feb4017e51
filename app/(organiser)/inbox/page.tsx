import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { EmptyState } from '@/app/_ui/empty-state'
import { PageFrame } from '@/app/_ui/page-frame'
import { readInbox } from '@/lib/mail/queries/read-inbox'
import { can } from '@/lib/permissions/policy'
import { env } from '@/lib/platform/env'
import { servedDatabase } from '@/lib/platform/served-database'
import { guardAccount } from '../_frame/guard-event'
import { OfficeBar } from '../_frame/office-bar'
import { InboxMails } from './_inbox/inbox-mails'

export const metadata: Metadata = { title: 'Inbox' }

/** Every mail of the club, where no mail server is set. With one the mail is where it was sent, and this page is not there. */
export default async function InboxPage() {
  const account = await guardAccount('/inbox')
  const { smtp, origin } = env()
  if (smtp !== null || !can(account.clubRoles, 'mail:see')) notFound()
  const mails = readInbox(servedDatabase(), account.clubId)
  return (
    <PageFrame
      title="Inbox"
      subtitle="No mail server is set, so every mail stays here. Nothing has left this machine."
      width="text"
      navigation={<OfficeBar name={account.name} />}
    >
      {mails.length === 0 ? (
        <EmptyState title="No mail yet">What is sent from the mail page of an event arrives here within seconds.</EmptyState>
      ) : (
        <InboxMails mails={mails} origin={origin} />
      )}
    </PageFrame>
  )
}
