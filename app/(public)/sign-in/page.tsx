import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { PageFrame } from '@/app/_ui/page-frame'
import { ownPath } from '@/lib/accounts/own-path'
import { landingPath } from '@/lib/accounts/queries/landing-path'
import { pageAccount } from '@/lib/http/page-account'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { PlainBar } from '../_frame/plain-bar'
import { SignInForm } from './_sign-in/sign-in-form'

export const metadata: Metadata = { title: 'Sign in' }

/** Who is signed in already is led on: to where they were going, or to their work of today. */
export default async function SignInPage({ searchParams }: { readonly searchParams: Promise<{ readonly next?: string | string[] }> }) {
  const next = ownPath((await searchParams).next)
  const account = await pageAccount()
  if (account) redirect(next ?? landingPath(servedDatabase(), account, now()))
  return (
    <PageFrame title="Sign in" width="text" navigation={<PlainBar />}>
      <SignInForm next={next} />
      <p className="mt-8 border-t pt-4 text-muted">
        Crew without an account scan the join code on the organiser’s screen instead. Bay and pit exit go on recording on an enrolled
        device, signed in or not.
      </p>
    </PageFrame>
  )
}
