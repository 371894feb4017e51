import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { PageFrame } from '@/app/_ui/page-frame'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { describeSticker } from '@/lib/public-pass/queries/describe-sticker'
import { dayReading } from '@/lib/sync/server/day-reading'
import { PlainBar } from '../../_frame/plain-bar'
import { StickerWords } from './sticker-words'

export const dynamic = 'force-dynamic'
export const metadata: Metadata = { title: 'Sticker', robots: { index: false, follow: false } }

/** What a sticker opens, for anybody with a phone camera. Whatever the address holds, it is judged and never followed. */
export default async function StickerPage({ params }: { readonly params: Promise<{ token: string }> }) {
  const sticker = await describeSticker(servedDatabase(), (await params).token, dayReading, now())
  if (sticker.is === 'not-ours') notFound()
  return (
    <PageFrame
      title={sticker.what === 'pass' ? 'Pass of a car' : 'Band of a person'}
      subtitle={`${sticker.event}, ${sticker.venue}`}
      width="text"
      navigation={<PlainBar />}
    >
      <StickerWords sticker={sticker} />
    </PageFrame>
  )
}
