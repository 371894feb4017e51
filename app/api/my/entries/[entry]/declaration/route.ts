import { signDeclaration } from '@/lib/contracts/my-declaration'
import { signDeclaration as sign } from '@/lib/entrants/commands/sign-declaration'
import { handle } from '@/lib/http/server'
import { dayReading } from '@/lib/sync/server/day-reading'

export const POST = handle(signDeclaration, sign(dayReading))
