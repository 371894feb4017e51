import { readReport } from '@/app/(organiser)/_frame/read-report'
import { reportJson } from '@/lib/contracts/report'
import { handleDownload } from '@/lib/http/download'
import { writeReportJson } from '@/lib/reports/queries/write-report'

export const GET = handleDownload(reportJson, writeReportJson(readReport))
