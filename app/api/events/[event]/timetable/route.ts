import { saveTimetable as contract } from '@/lib/contracts/events'
import { saveTimetable } from '@/lib/events/commands/save-timetable'
import { handle } from '@/lib/http/server'

export const PUT = handle(contract, saveTimetable)
