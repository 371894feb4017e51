import { makeJoinCode } from '@/lib/contracts/join'
import { giveJoinCode } from '@/lib/crew/commands/give-join-code'
import { handle } from '@/lib/http/server'

export const POST = handle(makeJoinCode, giveJoinCode)
