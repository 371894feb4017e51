import { mailReaders } from '@/app/_mail/mail-readers'
import { eventMail, writeMailing } from '@/lib/contracts/mail'
import { handle } from '@/lib/http/server'
import { writeMailingBy } from '@/lib/mail/commands/write-mailing'
import { seeMail } from '@/lib/mail/queries/see-mail'

export const GET = handle(eventMail, seeMail(mailReaders))
export const POST = handle(writeMailing, writeMailingBy(mailReaders))
