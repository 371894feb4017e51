import type { EntryEdit } from '@/lib/contracts/entry-edit'

/** One line of what became of an entry. */
export interface EntryEvent {
  readonly at: number
  readonly who: string
  readonly words: string
  /** It stands in the day's log, signed. */
  readonly isRecord: boolean
}

/** Somebody who is in the event, to be put into a car. */
export interface EventPerson {
  readonly id: string
  readonly name: string
}

/** An entry as its page shows and edits it. */
export interface EntryView {
  readonly id: string
  readonly eventId: string
  readonly version: number
  readonly hasRecords: boolean
  readonly values: EntryEdit
  /** E-mails and mobiles are the organiser's; to others they read empty and cannot be changed. */
  readonly seesContacts: boolean
  readonly groups: readonly { readonly id: string; readonly name: string }[]
  readonly facts: readonly {
    readonly name: string
    readonly label: string
    readonly values: readonly { readonly value: string | number | boolean; readonly label: string }[]
  }[]
  readonly history: readonly EntryEvent[]
  /** Who else is at the event: one driver of two cars is one person. */
  readonly others: readonly EventPerson[]
}
