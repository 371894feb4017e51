import { choosePassword } from '@/lib/accounts/commands/choose-password'
import { choosePassword as contract } from '@/lib/contracts/crew-invite'
import { handle } from '@/lib/http/server'

export const POST = handle(contract, choosePassword)
