import { addKit } from '@/lib/contracts/my-garage'
import { addMyKit } from '@/lib/entrants/commands/keep-garage'
import { handle } from '@/lib/http/server'

export const POST = handle(addKit, addMyKit)
