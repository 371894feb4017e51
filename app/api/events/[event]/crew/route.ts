import { decideCrew, listCrew } from '@/lib/contracts/crew'
import { decideOnCrew } from '@/lib/crew/commands/decide-on-crew'
import { seeCrew } from '@/lib/crew/queries/see-crew'
import { handle } from '@/lib/http/server'

export const GET = handle(listCrew, seeCrew)
export const POST = handle(decideCrew, decideOnCrew)
