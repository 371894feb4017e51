import type { Metadata } from 'next'
import { Notice } from '@/app/_ui/notice'
import { PageFrame } from '@/app/_ui/page-frame'
import { findPasswordLink } from '@/lib/accounts/queries/find-password-link'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { PlainBar } from '../../_frame/plain-bar'
import { PasswordForm } from './_password/password-form'

export const metadata: Metadata = { title: 'Choose a password', referrer: 'no-referrer' }

export default async function PasswordPage({ params }: { readonly params: Promise<{ token: string }> }) {
  const { token } = await params
  const link = findPasswordLink(servedDatabase(), token, now())
  return (
    <PageFrame title="Choose a password" width="text" navigation={<PlainBar />}>
      {link === null ? (
        <Notice
          happened="This link has been used, or its seven days are over."
          kept="Nothing was changed."
          todo="Ask the organiser to invite you again. Who has a password already signs in as always."
        />
      ) : (
        <PasswordForm token={token} email={link.email} />
      )}
    </PageFrame>
  )
}
