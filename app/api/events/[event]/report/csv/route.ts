import { readReport } from '@/app/(organiser)/_frame/read-report'
import { reportCsv } from '@/lib/contracts/report'
import { handleDownload } from '@/lib/http/download'
import { writeReportCsv } from '@/lib/reports/queries/write-report'

export const GET = handleDownload(reportCsv, writeReportCsv(readReport))
