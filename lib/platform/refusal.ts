import type { ProblemCode } from '@/lib/contracts/problem'

/** An expected failure, given back by a command as its value; `handle` turns it into status and words by its code. */
export class Refusal {
  constructor(
    readonly code: ProblemCode,
    readonly details: RefusalDetails,
  ) {}
}

export interface RefusalDetails {
  /** Words for this one case, where they can say more than the table's. */
  readonly what?: string
  readonly kept?: string
  readonly todo?: string
  readonly issues?: readonly { readonly path: string; readonly message: string }[]
  readonly retryAfterSeconds?: number
}

/** Refuses with a code of the closed list, and more exact words where there are some. */
export function refuse(code: ProblemCode, details: RefusalDetails = {}): Refusal {
  return new Refusal(code, details)
}

export function isRefusal(value: unknown): value is Refusal {
  return value instanceof Refusal
}
