/** Why something could not be done on this device. Closed: screens may switch on it. */
export type DayProblemCode =
  | 'storage-full'
  | 'storage-failed'
  | 'storage-low'
  | 'no-room-for-photo'
  | 'locked'
  | 'wrong-pin'
  | 'not-allowed'
  | 'not-loaded'
  | 'not-passed'
  | 'band-taken'
  | 'no-key'
  | 'unreadable-draft'
  | 'offline'
  | 'refused-by-server'
  | 'too-old'
  | 'needs-attention'
  | 'wrong-words'
  | 'clock-wrong'
  | 'no-web-locks'
  | 'not-persisted'

/** What happened, what was kept, what to do: three sentences for a person, and the code for the screen. */
export interface DayProblem {
  readonly code: DayProblemCode
  readonly what: string
  readonly kept: string
  readonly todo: string
}

/** The only error the day client rejects with when something expected went wrong. */
export class DayError extends Error {
  override readonly name = 'DayError'
  constructor(readonly problem: DayProblem) {
    super(`${problem.code}: ${problem.what}`)
  }
}

/** The problem of a rejection; null when it is not one of ours (a bug: let it reach the error boundary). */
export function dayProblemOf(error: unknown): DayProblem | null {
  return error instanceof DayError ? error.problem : null
}
