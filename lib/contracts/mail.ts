import * as z from 'zod/mini'
import { contract } from './contract'

const params = z.strictObject({ event: z.uuid() })

/** What an organiser sends to many at once. */
export const MAILINGS = ['invitations', 'reminders', 'would-not-be-passed', 'results'] as const
export type Mailing = (typeof MAILINGS)[number]
export const MAIL_KINDS = ['invitation', 'declaration-reminder', 'would-not-be-passed', 'result', 'crew-invitation'] as const

export const mailView = z.object({
  id: z.string(),
  kind: z.enum(MAIL_KINDS),
  /** Number of the entry it is about; empty where it is about none. */
  number: z.string(),
  to: z.string(),
  subject: z.string(),
  createdAt: z.int(),
  /** `given-up`: not tried again by itself. */
  state: z.enum(['waits', 'sent', 'given-up']),
  tries: z.int(),
  /** When it is tried next; null unless it waits. */
  nextTryAt: z.nullable(z.int()),
  sentAt: z.nullable(z.int()),
  /** Why the last try failed; null where none did. */
  why: z.nullable(z.string()),
})
export type MailView = z.infer<typeof mailView>

/** `GET /api/events/[event]/mail`: what was sent, what waits, what failed, and how many each mailing would write now. */
export const eventMail = contract({
  name: 'event-mail',
  method: 'GET',
  path: '/api/events/[event]/mail',
  auth: 'session',
  action: 'mail:see',
  limitBytes: 0,
  rate: { times: 120, perSeconds: 60 },
  params,
  response: z.object({
    /** `inbox`: no mail server is set, nothing leaves this machine. */
    sender: z.enum(['smtp', 'inbox']),
    /** How many mails each would write now: those already written are not counted. */
    due: z.object({ invitations: z.int(), reminders: z.int(), 'would-not-be-passed': z.int(), results: z.int() }),
    /** Drivers of entries that are not withdrawn, and those of them without an address, by entry number and name. */
    drivers: z.int(),
    withoutAddress: z.array(z.object({ number: z.string(), name: z.string() })),
    /** Failed ones first, then the newest. */
    mails: z.array(mailView),
  }),
})
export type EventMail = z.infer<typeof eventMail.response>

/** `POST /api/events/[event]/mail`: writes a mailing. Asked twice it writes nothing the second time. */
export const writeMailing = contract({
  name: 'mail-write',
  method: 'POST',
  path: '/api/events/[event]/mail',
  auth: 'session',
  action: 'mail:send',
  limitBytes: 1_024,
  rate: { times: 30, perSeconds: 60 },
  params,
  /** `expected`: the count the person has seen; where it is another one meanwhile, nothing is written. */
  body: z.strictObject({ what: z.enum(MAILINGS), expected: z.int().check(z.gte(1)) }),
  response: z.object({ written: z.int() }),
})

/** `POST /api/events/[event]/mail/again`: tries a mail again that failed, at once. */
export const mailAgain = contract({
  name: 'mail-again',
  method: 'POST',
  path: '/api/events/[event]/mail/again',
  auth: 'session',
  action: 'mail:send',
  limitBytes: 1_024,
  rate: { times: 120, perSeconds: 60 },
  params,
  body: z.strictObject({ mail: z.uuid() }),
  response: mailView,
})
