import type { Mailing } from '@/lib/contracts/mail'

interface MailingWords {
  readonly title: string
  /** What it says, and to whom. */
  readonly about: string
  readonly button: (mails: number) => string
  /** Why there is nothing to send. */
  readonly nothing: string
}

const mails = (count: number) => (count === 1 ? '1 mail' : `${count} mails`)

export const MAILING_WORDS: Readonly<Record<Mailing, MailingWords>> = {
  invitations: {
    title: 'Invitation',
    about: 'The link to the entry, to every driver who has not had it.',
    button: (count) => `Invite all not invited: ${mails(count)}`,
    nothing: 'Everybody with an address is invited.',
  },
  reminders: {
    title: 'Declaration reminder',
    about: 'To drivers of cars that nobody has declared, once a day at most.',
    button: (count) => `Remind those without declaration: ${mails(count)}`,
    nothing: 'Nobody is to be reminded today.',
  },
  'would-not-be-passed': {
    title: 'Would not be passed',
    about: 'What the rules would refuse of what was declared. From a week before the event it goes out by itself, once a declaration.',
    button: (count) => `Tell them now: ${mails(count)}`,
    nothing: 'Nothing that was declared would be refused, or they know it.',
  },
  results: {
    title: 'Result',
    about: 'How each car stands, and what is open on it. A verdict that changes is sent anew.',
    button: (count) => `Send results: ${mails(count)}`,
    nothing: 'No car has a result that was not sent.',
  },
}
