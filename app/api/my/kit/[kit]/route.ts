import { keepKit } from '@/lib/contracts/my-garage'
import { keepMyKit } from '@/lib/entrants/commands/keep-garage'
import { handle } from '@/lib/http/server'

export const PUT = handle(keepKit, keepMyKit)
