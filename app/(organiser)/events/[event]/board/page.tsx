import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { readBoard } from '@/lib/board/queries/see-board'
import { can } from '@/lib/permissions/policy'
import { now } from '@/lib/platform/clock'
import { servedDatabase } from '@/lib/platform/served-database'
import { dayReading } from '@/lib/sync/server/day-reading'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { BoardScreen } from './_board/board-screen'

export const metadata: Metadata = { title: 'Board' }

export default async function BoardPage({ params }: { readonly params: Promise<{ event: string }> }) {
  const guarded = await guardEvent((await params).event, 'board', 'board:see')
  const board = readBoard(dayReading, servedDatabase(), guarded.event, now())
  if (board === null) notFound()
  return (
    <EventFrame guarded={guarded} tab="board" width="full">
      <BoardScreen eventId={guarded.event.id} first={board} seesHolds={can(guarded.roles, 'holds:see')} />
    </EventFrame>
  )
}
