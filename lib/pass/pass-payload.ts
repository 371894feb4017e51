/** The 19 payload bytes of a pass or band token (SYNC, "The pass token (v1)"), read out. */
export interface PassPayload {
  readonly type: 'pass' | 'band'
  /** Which device of the event signed it; append-only per event, never reused. 0 is the server. */
  readonly kid: number
  /** The event's number, given by the server. */
  readonly event: number
  /** That device's own counter, from 1: a pass is (event, kid, counter). */
  readonly counter: number
  /** The entry's number within the event, given by the server; 0 for a band. */
  readonly entry: number
  /** First venue day, `YYYY-MM-DD`, 2020-01-01 or later. */
  readonly validFrom: string
  /** 1 to 7 venue days. */
  readonly days: number
  readonly conditions: boolean
  readonly passengerSeatUsable: boolean
  readonly printedAhead: boolean
  /** Up to six characters, folded to the token's alphabet; a band's own number for a band. */
  readonly number: string
  /** Up to six characters; empty for a band. */
  readonly plateTail: string
}

/** Names a pass for ever: `event.kid.counter`. */
export type PassId = string

export function passId(payload: Pick<PassPayload, 'event' | 'kid' | 'counter'>): PassId {
  return `${payload.event}.${payload.kid}.${payload.counter}`
}
