import { voidPass } from '@/lib/contracts/void-pass'
import { voidPass as declareVoid } from '@/lib/holds/commands/void-pass'
import { handle } from '@/lib/http/server'
import { appendServerRecords } from '@/lib/sync/server/append-server-records'
import { dayReading } from '@/lib/sync/server/day-reading'

export const POST = handle(voidPass, declareVoid(appendServerRecords, dayReading))
