/** What the public page of a sticker says. No name, no contact, nothing of what was found. */
export type Sticker =
  | { readonly is: 'not-ours' }
  | {
      readonly is: 'valid' | 'another-day' | 'not-valid' | 'not-reported'
      readonly what: 'pass' | 'band'
      readonly number: string
      readonly plateTail: string
      readonly event: string
      readonly venue: string
      /** Venue days it was issued for, and the venue's day now. */
      readonly firstDay: string
      readonly lastDay: string
      readonly today: string
      /** Under conditions that the crew knows. */
      readonly conditions: boolean
    }
