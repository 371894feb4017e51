import { createEvent as contract } from '@/lib/contracts/events'
import { createEvent } from '@/lib/events/commands/create-event'
import { handle } from '@/lib/http/server'

export const POST = handle(contract, createEvent)
