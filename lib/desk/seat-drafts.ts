import type { RecordOf } from '@/lib/inspection/record'

type Change = Pick<RecordOf<'entry-changed'>, 'kind' | 'subject' | 'change'> & { readonly notes?: string[] }

/** Somebody who turned up at the desk, for one car or several. */
export interface TurnedUp {
  /** An id of theirs, made on this device where they are new. */
  readonly person: string
  readonly role: 'driver' | 'passenger' | 'instructor'
  /** Null for somebody who is known already. */
  readonly minor: boolean | null
  readonly isNew: boolean
  readonly cars: readonly string[]
}

/** The reference that the name of a new person stands under in the drafts. */
export const NAME_REF = 'name'

/** One record a car: whoever rides in twelve is one person, seated twelve times. A new one's name goes with each as a note, so that none waits for another. */
export function seatDrafts({ person, role, minor, isNew, cars }: TurnedUp): readonly Change[] {
  return cars.map((car) => ({
    kind: 'entry-changed' as const,
    subject: { car },
    change: {
      what: 'people' as const,
      added: [person],
      removed: [],
      passengers: role === 'passenger' ? [person] : [],
      seated: { person, role, minor },
    },
    ...(isNew ? { notes: [`note:${NAME_REF}`] } : {}),
  }))
}
