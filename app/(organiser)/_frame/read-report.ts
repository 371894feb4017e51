import 'server-only'
import type { ReadReport } from '@/lib/reports/queries/write-report'
import { pinnedBook } from '@/lib/sync/server/pinned-books'
import { wholeLog } from '@/lib/sync/server/whole-log'

/** How a report reads the log; a feature never reads the sync's rows itself. */
export const readReport: ReadReport = { logOf: wholeLog, bookOf: pinnedBook }
