import type { CheckState, Verdict } from './state'

/** What a verdict is drawn from. */
export interface VerdictGrounds {
  readonly isWithdrawn: boolean
  readonly isHeld: boolean
  readonly checks: Iterable<CheckState>
  /** A `presented` is there and its book at hand. */
  readonly isDerivable: boolean
  readonly isPresented: boolean
  /** Somebody looked at something here, carried-forward findings not counted. */
  readonly isLookedAt: boolean
  readonly hasFindings: boolean
  readonly isDeclared: boolean
}

/** The verdict: the first that applies (rule F6). */
export function verdictOf(grounds: VerdictGrounds): Verdict {
  if (grounds.isWithdrawn) return 'withdrawn'
  if (grounds.isHeld) return 'held'
  const checks = [...grounds.checks]
  if (checks.some((check) => check.standing === 'fail')) return 'not passed'
  if (!grounds.isDerivable || !grounds.isLookedAt || checks.some(isOpen)) return unfinished(grounds)
  return checks.some(hasReservation) ? 'passed with advisories' : 'passed'
}

/** Whether a required check keeps the subject from passing. */
export function isOpen(check: CheckState): boolean {
  return check.required && !isStandingWell(check)
}

/** Whether the check stands at ok or advisory. */
export function isStandingWell({ standing }: CheckState): boolean {
  return standing === 'ok' || standing === 'advisory'
}

function unfinished({ isLookedAt, isDeclared, isPresented, hasFindings }: VerdictGrounds): Verdict {
  if (!isLookedAt && isDeclared) return 'declared only'
  return isPresented || hasFindings ? 'in progress' : 'not presented'
}

/** Any head that is advisory or a dispensation, standing or not, and an optional check that could not be seen. */
export function hasReservation(check: CheckState): boolean {
  return check.standing === 'could-not-see' || check.heads.some((head) => !head.lapsed && head.outcome === 'advisory')
}
