import { signIn } from '@/lib/contracts/sign-in'
import { signInWithPassword } from '@/lib/accounts/commands/sign-in-with-password'
import { handle } from '@/lib/http/server'

export const POST = handle(signIn, signInWithPassword)
