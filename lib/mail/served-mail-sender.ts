import 'server-only'
import { env } from '@/lib/platform/env'
import { inboxMailSender } from './inbox-mail-sender'
import type { MailSender } from './port'
import { smtpMailSender } from './smtp-mail-sender'

const PATIENCE_MS = 20_000
const THIS_MACHINE: readonly string[] = ['localhost', '127.0.0.1', '[::1]']

/** How this server sends: by `LOCKWIRE_SMTP`, or into the demo's inbox where that is not set. */
export function servedMailSender(): MailSender {
  const { smtp } = env()
  if (smtp === null) return inboxMailSender
  const allowPlain = THIS_MACHINE.includes(new URL(smtp.url).hostname)
  return smtpMailSender({ ...smtp, allowPlain, patienceMs: PATIENCE_MS })
}
