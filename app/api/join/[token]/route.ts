import { join, seeJoinCode } from '@/lib/contracts/join'
import { askToJoin } from '@/lib/crew/commands/ask-to-join'
import { describeJoinCode } from '@/lib/crew/queries/describe-join-code'
import { handle } from '@/lib/http/server'

export const GET = handle(seeJoinCode, describeJoinCode)
export const POST = handle(join, askToJoin)
