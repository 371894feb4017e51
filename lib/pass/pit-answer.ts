/** What the pit exit says, and everything the marshal compares. Made by `decideAtPitExit`; no screen decides anything further. */
export interface PitAnswer {
  readonly answer: 'PASSED' | 'HOLD' | 'CHECK'
  /** Stable code of the first rule that decided (`dead-pass`, `list-stale`, `foreign-code`). */
  readonly code: string
  /** Why, in words; one line each, most important first. */
  readonly why: readonly string[]
  /** What the marshal does now. */
  readonly todo: string
  readonly number: string | null
  readonly plateTail: string | null
  readonly plate: string | null
  readonly colour: string | null
  readonly model: string | null
  readonly groupName: string | null
  readonly people: readonly { readonly name: string; readonly bandNumber: string | null; readonly may: boolean; readonly why: string }[]
  readonly passengerSeatUsable: boolean | null
  readonly entry: string | null
  readonly pass: string | null
}
