/** The marshal said that cars of any group may go: an open pit lane. */
export const ANY_GROUP = 'any'

/**
 * What this device knows besides the list, as far as it can only add a block or a doubt. Its own holds, finds and dead passes are on the list already:
 * the list handed to `decideAtPitExit` is the server's with the device's log laid over it.
 */
export interface PitDevice {
  /** Corrected clock, ms. */
  readonly now: number
  /** Venue day by the corrected clock. */
  readonly day: string
  /** The venue's IANA time zone, for the times in the words. */
  readonly timeZone: string
  /** It was set back since the last contact. */
  readonly clockWentBackwards: boolean
  /** Organiser's limit. */
  readonly listStaleMinutes: number
  /** When a read-back last agreed with the list (rule P5), ms; null if none did. */
  readonly readBackAt: number | null
  /** Group id the marshal set as now running, or `ANY_GROUP`; null while nobody said, which is a doubt where there are several. */
  readonly runningGroup: string | null
  /** Blocks this device adds by itself: a number heard on the radio, a recall its own clock or timetable says is due. */
  readonly blocks: readonly PitBlock[]
}

/** A number is all that is heard on the radio. */
export interface PitBlock {
  readonly about: { readonly entry: string } | { readonly number: string } | { readonly person: string }
  readonly words: string
  /** Since when, ms; null where nobody said. */
  readonly at: number | null
}
