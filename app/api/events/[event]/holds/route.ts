import { holds } from '@/lib/contracts/holds'
import { seeHolds } from '@/lib/holds/queries/see-holds'
import { handle } from '@/lib/http/server'
import { dayReading } from '@/lib/sync/server/day-reading'

export const GET = handle(holds, seeHolds(dayReading))
