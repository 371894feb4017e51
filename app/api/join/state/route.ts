import { joinState } from '@/lib/contracts/join'
import { describeClaim } from '@/lib/crew/queries/describe-claim'
import { handle } from '@/lib/http/server'

export const POST = handle(joinState, describeClaim)
