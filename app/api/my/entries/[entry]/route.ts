import { myEntry } from '@/lib/contracts/my-entry'
import { seeMyEntry } from '@/lib/entrants/queries/see-my-entry'
import { handle } from '@/lib/http/server'
import { dayReading } from '@/lib/sync/server/day-reading'

export const GET = handle(myEntry, seeMyEntry(dayReading))
