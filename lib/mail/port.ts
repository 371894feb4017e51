/** One mail, ready to go: plain text. */
export interface OutgoingMail {
  /** Stable over every try, so that a receiver who gets it twice can tell. */
  readonly id: string
  readonly to: string
  readonly subject: string
  readonly text: string
}

/**
 * The way mail goes out. Resolves once another machine has taken the mail over, or it lies in the demo's inbox; rejects with a `MailFailure`.
 * It knows no database and no rhythm: who calls it keeps the mail and tries again.
 */
export interface MailSender {
  /** `inbox`: nothing leaves this machine. */
  readonly kind: 'smtp' | 'inbox'
  readonly send: (mail: OutgoingMail) => Promise<void>
}

/** `later`: another try may succeed (no connection, a busy server, no secure line, a wrong password). `never`: this mail will not be taken. */
export class MailFailure extends Error {
  override readonly name = 'MailFailure'
  constructor(
    readonly when: 'later' | 'never',
    /** For the organiser: one sentence. */
    readonly words: string,
    options?: ErrorOptions,
  ) {
    super(words, options)
  }
}
