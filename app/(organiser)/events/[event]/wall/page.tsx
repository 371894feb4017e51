import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { readBoard } from '@/lib/board/queries/see-board'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { dayReading } from '@/lib/sync/server/day-reading'
import { guardEvent } from '../../../_frame/guard-event'
import { WallScreen } from './_wall/wall-screen'

export const metadata: Metadata = { title: 'Wall' }

export default async function WallPage({ params }: { readonly params: Promise<{ event: string }> }) {
  const { event } = await guardEvent((await params).event, 'wall', 'board:see')
  const board = readBoard(dayReading, servedDatabase(), event, now())
  if (board === null) notFound()
  return <WallScreen eventId={event.id} title={event.name} first={board} />
}
