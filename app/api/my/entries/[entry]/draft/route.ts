import { saveDraft } from '@/lib/contracts/my-declaration'
import { saveDeclarationDraft } from '@/lib/entrants/commands/save-declaration-draft'
import { handle } from '@/lib/http/server'
import { dayReading } from '@/lib/sync/server/day-reading'

export const PUT = handle(saveDraft, saveDeclarationDraft(dayReading))
