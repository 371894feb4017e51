import type { Mailing } from '@/lib/contracts/mail'
import { invitationText, type MailEvent, type MailText, reminderText, resultText, wouldNotBePassedText } from './mail-texts'
import type { PreCheckRow, ResultRow } from './mail-readers'

/** A driver of an entry, with an address. */
export interface Receiver {
  readonly entry: { readonly id: string; readonly number: string; readonly model: string }
  readonly person: { readonly id: string; readonly name: string }
  readonly to: string
}

/** A mail that would be written: its text wants a link, which is made only when it is. */
export interface PlannedMail {
  readonly kind: 'invitation' | 'declaration-reminder' | 'would-not-be-passed' | 'result'
  /** What makes it the same mail. */
  readonly sameAs: string
  readonly receiver: Receiver
  readonly text: (link: string) => MailText
}

export interface MailingFacts {
  readonly event: MailEvent
  readonly receivers: readonly Receiver[]
  readonly preChecks: readonly PreCheckRow[]
  readonly results: readonly ResultRow[]
  /** Venue day: nobody is reminded twice on one. */
  readonly day: string
  /** Whether a mail that is the same as this is written already. */
  readonly isWritten: (sameAs: string) => boolean
}

/** Which mails a mailing writes now: to every receiver it concerns, never the same twice. */
export function planMailing(what: Mailing, facts: MailingFacts): readonly PlannedMail[] {
  const known = new Set<string>()
  return facts.receivers
    .flatMap((receiver) => PLANS[what](receiver, facts) ?? [])
    .filter(({ sameAs }) => {
      // One driver may stand twice on an entry, as driver and owner.
      const isNew = !known.has(sameAs) && !facts.isWritten(sameAs)
      known.add(sameAs)
      return isNew
    })
}

type Plan = (receiver: Receiver, facts: MailingFacts) => PlannedMail | null

// The address is part of what makes a mail the same: put right after a failure, it is a new one.
const PLANS: Readonly<Record<Mailing, Plan>> = {
  invitations: (receiver, { event }) => ({
    kind: 'invitation',
    sameAs: `invitation:${receiver.entry.id}:${receiver.to}`,
    receiver,
    text: (link) => invitationText(event, receiver.entry, receiver.person.name, link),
  }),
  reminders: (receiver, { event, preChecks, day }) => {
    if (preChecks.some(({ entry, version }) => entry === receiver.entry.id && version !== null)) return null
    return {
      kind: 'declaration-reminder',
      sameAs: `declaration-reminder:${receiver.entry.id}:${receiver.to}:${day}`,
      receiver,
      text: (link) => reminderText(event, receiver.entry, receiver.person.name, link),
    }
  },
  'would-not-be-passed': (receiver, { event, preChecks }) => {
    const row = preChecks.find(({ entry }) => entry === receiver.entry.id)
    if (!row || row.version === null || !row.worries.some(({ weight }) => weight === 'fail')) return null
    return {
      kind: 'would-not-be-passed',
      sameAs: `would-not-be-passed:${receiver.entry.id}:${receiver.to}:${row.version}`,
      receiver,
      text: (link) => wouldNotBePassedText(event, row, receiver.person.name, link),
    }
  },
  results: (receiver, { event, results, day }) => {
    const row = results.find(({ entry }) => entry === receiver.entry.id)
    // Who was never seen to the end has no result.
    if (row === undefined || !['passed', 'passed with advisories', 'not passed', 'held'].includes(row.verdict)) return null
    return {
      kind: 'result',
      sameAs: `result:${receiver.entry.id}:${receiver.to}:${day}:${row.verdict}`,
      receiver,
      text: () => resultText(event, receiver.entry, receiver.person.name, row.verdict, row.open),
    }
  },
}
