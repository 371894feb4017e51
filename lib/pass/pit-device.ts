/** What this device knows besides the list, as far as it can only add a block or a doubt. */
export interface PitDevice {
  /** Corrected clock, ms. */
  readonly now: number
  /** Venue day by the corrected clock. */
  readonly day: string
  /** It was set back since the last contact. */
  readonly clockWentBackwards: boolean
  /** Organiser's limit. */
  readonly listStaleMinutes: number
  /** When a read-back last agreed with the list (rule P5), ms; null if none did. */
  readonly readBackAt: number | null
  /** Group id the marshal set as now running; null while nobody said. */
  readonly runningGroup: string | null
  /** Blocks this device adds by itself: a number heard on the radio, a recall its own clock says is due. */
  readonly blocks: readonly PitBlock[]
}

export interface PitBlock {
  /** Entry id, or a number where that is all that was heard. */
  readonly entry?: string
  readonly number?: string
  readonly words: string
}
