import { inviteCrew as contract } from '@/lib/contracts/crew-invite'
import { inviteCrew } from '@/lib/crew/commands/invite-crew'
import { handle } from '@/lib/http/server'

export const POST = handle(contract, inviteCrew)
