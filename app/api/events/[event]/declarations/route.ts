import { eventDeclarations } from '@/lib/contracts/event-declarations'
import { seeDeclarations } from '@/lib/entrants/queries/pre-checks-of'
import { handle } from '@/lib/http/server'
import { dayReading } from '@/lib/sync/server/day-reading'

export const GET = handle(eventDeclarations, seeDeclarations(dayReading))
