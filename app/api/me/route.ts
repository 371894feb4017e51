import { me } from '@/lib/contracts/me'
import { describeMe } from '@/lib/accounts/queries/describe-me'
import { handle } from '@/lib/http/server'

export const GET = handle(me, describeMe)
