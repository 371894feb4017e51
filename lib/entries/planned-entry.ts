/** A person of a planned entry; two of them with one `key` are one person. */
export interface PlannedPerson {
  readonly row: number
  readonly role: 'driver' | 'passenger' | 'instructor'
  readonly name: string
  readonly email: string
  readonly mobile: string
}

/** One car as a list, with its answers, leaves it. */
export interface PlannedEntry {
  readonly row: number
  readonly number: string
  readonly plate: string
  readonly model: string
  readonly colour: string
  readonly group: string
  readonly passengerSeats: number
  readonly note: string
  readonly people: PlannedPerson[]
}
