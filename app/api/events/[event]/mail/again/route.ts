import { mailAgain } from '@/lib/contracts/mail'
import { handle } from '@/lib/http/server'
import { tryMailAgain } from '@/lib/mail/commands/try-mail-again'

export const POST = handle(mailAgain, tryMailAgain)
