import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { readMyEntry } from '@/lib/entrants/queries/see-my-entry'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { dayReading } from '@/lib/sync/server/day-reading'
import { daysInWords } from '@/app/(organiser)/_frame/event-frame'
import { EntrantFrame } from '../../_frame/entrant-frame'
import { guardEntrant } from '../../_frame/guard-entrant'
import { EntryScreen } from './_entry/entry-screen'

export const metadata: Metadata = { title: 'My entry' }

export default async function EntryPage({ params }: { readonly params: Promise<{ entry: string }> }) {
  const { entry } = await params
  const account = await guardEntrant(`/entries/${encodeURIComponent(entry)}`)
  const first = readMyEntry(dayReading, servedDatabase(), account, entry, now())
  if (first === null) notFound()
  return (
    <EntrantFrame title={first.event.name} subtitle={`${first.event.venue} · ${daysInWords(first.event)}`} tab={null}>
      <EntryScreen first={first} />
    </EntrantFrame>
  )
}
