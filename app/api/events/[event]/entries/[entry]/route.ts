import { editEntry as contract } from '@/lib/contracts/entry-edit'
import { editEntry } from '@/lib/entries/commands/edit-entry'
import { handle } from '@/lib/http/server'
import { appendServerRecords } from '@/lib/sync/server/append-server-records'
import { dayReading } from '@/lib/sync/server/day-reading'

export const PATCH = handle(contract, editEntry(appendServerRecords, dayReading))
