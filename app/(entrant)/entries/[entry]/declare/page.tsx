import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { daysInWords } from '@/app/(organiser)/_frame/event-frame'
import { Notice } from '@/app/_ui/notice'
import { declaringOf } from '@/lib/entrants/queries/declaring-of'
import { ERRORS } from '@/lib/http/errors'
import { now } from '@/lib/platform/clock'
import { isRefusal } from '@/lib/platform/refusal'
import { servedDatabase } from '@/lib/platform/served-database'
import { dayReading } from '@/lib/sync/server/day-reading'
import { EntrantFrame } from '../../../_frame/entrant-frame'
import { guardEntrant } from '../../../_frame/guard-entrant'
import { DeclareScreen } from './_declare/declare-screen'

export const metadata: Metadata = { title: 'Declaration' }

export default async function DeclarePage({ params }: { readonly params: Promise<{ entry: string }> }) {
  const { entry } = await params
  const account = await guardEntrant(`/entries/${encodeURIComponent(entry)}/declare`)
  const declaring = declaringOf(dayReading, servedDatabase(), account, entry, now())
  if (isRefusal(declaring)) {
    if (declaring.code !== 'declaration-closed') notFound()
    const { what, kept, todo } = ERRORS['declaration-closed']
    return (
      <EntrantFrame title="Declaration" tab={null}>
        <Notice weight="news" happened={what} kept={kept} todo={todo} />
      </EntrantFrame>
    )
  }
  const { event } = declaring
  return (
    <EntrantFrame title="Declaration" subtitle={`${event.name}, ${daysInWords(event)}`} tab={null}>
      <DeclareScreen declaring={declaring} />
    </EntrantFrame>
  )
}
