import type { MailSender } from './port'

/** Where no mail server is set: every mail stays in the outbox, is read on the inbox page, and nothing leaves this machine. */
export const inboxMailSender: MailSender = { kind: 'inbox', send: async () => undefined }
