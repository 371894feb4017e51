import { openEntryLink } from '@/lib/contracts/entry-link'
import { openLink } from '@/lib/entrants/commands/open-entry-link'
import { handle } from '@/lib/http/server'

export const POST = handle(openEntryLink, openLink)
