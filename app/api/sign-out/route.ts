import { signOut } from '@/lib/contracts/sign-out'
import { endSignIn } from '@/lib/accounts/commands/end-sign-in'
import { handle } from '@/lib/http/server'

export const POST = handle(signOut, endSignIn)
