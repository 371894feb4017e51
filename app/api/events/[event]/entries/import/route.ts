import { entryImport } from '@/lib/contracts/entry-import'
import { importEntryList } from '@/lib/entries/commands/import-entry-list'
import { handle } from '@/lib/http/server'

export const POST = handle(entryImport, importEntryList)
