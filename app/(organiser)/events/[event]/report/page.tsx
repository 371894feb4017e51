import type { Metadata } from 'next'
import { servedDatabase } from '@/lib/platform/served-database'
import { stationCounts } from '@/lib/reports/station-counts'
import { EventFrame } from '../../../_frame/event-frame'
import { guardEvent } from '../../../_frame/guard-event'
import { readReport } from '../../../_frame/read-report'
import { ReportScreen } from './_report/report-screen'

export const metadata: Metadata = { title: 'Report' }

export default async function ReportPage({ params }: { readonly params: Promise<{ event: string }> }) {
  const guarded = await guardEvent((await params).event, 'report', 'report:see')
  const { id, checklistHash, limitsHash } = guarded.event
  const log = readReport.logOf(servedDatabase(), id)
  const book = readReport.bookOf(servedDatabase(), checklistHash, limitsHash)
  const setAside = log.filter(({ disposition }) => disposition === 'quarantined').length
  return (
    <EventFrame guarded={guarded} tab="report">
      <ReportScreen eventId={id} records={log.length} setAside={setAside} counts={book === null ? [] : stationCounts(log, book)} />
    </EventFrame>
  )
}
