import type { Metadata } from 'next'
import { connection } from 'next/server'
import { PageFrame } from '@/app/_ui/page-frame'
import { PlainBar } from '../../_frame/plain-bar'
import { JoinScreen } from './_join/join-screen'

// The address holds the code: no search engine may keep it, and no page we link to may hear it.
export const metadata: Metadata = { title: 'Join the crew', robots: { index: false, follow: false }, referrer: 'no-referrer' }

export default async function JoinPage({ params }: { readonly params: Promise<{ token: string }> }) {
  await connection()
  const { token } = await params
  return (
    <PageFrame title="Join the crew" width="text" navigation={<PlainBar />}>
      <JoinScreen token={token} />
    </PageFrame>
  )
}
