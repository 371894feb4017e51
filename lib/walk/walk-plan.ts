import type { BookCheck } from '@/lib/checklist/book'
import type { Place } from '@/lib/checklist/checklist'
import { isOneByOne } from '@/lib/checklist/places'
import type { CheckState } from '@/lib/inspection/state'

/** One check as the walk shows it. */
export interface WalkItem {
  readonly check: BookCheck
  /** How it stands; null where nobody has said anything. */
  readonly state: CheckState | null
  /** An answer stands that needs no other: ok, advisory, fail or could not see, and nothing asks to see it again. */
  readonly answered: boolean
  readonly required: boolean
  /** A hold, a due recall or a repair asks for a new look. */
  readonly seeAgain: boolean
}

/** One place of the walk: what is asked one by one, and what its closing sentence names. */
export interface WalkPlace {
  readonly place: Place
  /** No-go items first, then measurements, then whatever has been answered otherwise than ok. */
  readonly oneByOne: readonly WalkItem[]
  readonly together: readonly WalkItem[]
  /** Items without an answer, optional ones included: the holes that stay visible. */
  readonly unanswered: number
  /** Required ones among them. */
  readonly missing: number
  /** Those among them that have been seen and are to be seen again. */
  readonly seeAgain: number
  readonly worst: 'fail' | 'could-not-see' | 'advisory' | 'ok' | 'none'
}

const ANSWERED: readonly string[] = ['ok', 'advisory', 'fail', 'could-not-see']

/**
 * The walk of one subject, by place in the checklist's order. `asked` are the checks this depth asks, to which come those that a hold,
 * a repair or a standing answer brings in. Places where nothing is asked are left out.
 */
export function planWalk(
  places: readonly Place[],
  checks: readonly BookCheck[],
  asked: ReadonlySet<string>,
  states: ReadonlyMap<string, CheckState>,
): readonly WalkPlace[] {
  const items = checks
    .filter((check) => isPartOfWalk(check, asked, states.get(check.id)))
    .map((check) => toItem(check, states.get(check.id) ?? null))
  return places.map((place) => toPlace(place, items)).filter((place) => place.oneByOne.length + place.together.length > 0)
}

function isPartOfWalk(check: BookCheck, asked: ReadonlySet<string>, state: CheckState | undefined): boolean {
  if (asked.has(check.id)) return true
  // What was answered before a fact was corrected is no hole: it does not apply. A fail stands all the same, and is shown.
  if (!state || state.standing === 'does-not-apply') return false
  return state.required || state.heads.length > 0
}

function toItem(check: BookCheck, state: CheckState | null): WalkItem {
  const seeAgain = state !== null && state.unanswered.length > 0
  const answered = state !== null && ANSWERED.includes(state.standing) && !seeAgain && !state.disagreement
  return { check, state, answered, required: state?.required ?? check.required, seeAgain }
}

function toPlace(place: Place, all: readonly WalkItem[]): WalkPlace {
  const items = all.filter((item) => item.check.place === place.id && item.check.subject === place.subject)
  const isSingle = (item: WalkItem) => isOneByOne(item.check) || item.check.rule !== undefined || needsOwnLook(item)
  const rank = (item: WalkItem) => (item.check.critical ? 0 : item.check.measure ? 1 : 2)
  const open = items.filter((item) => !item.answered)
  return {
    place,
    oneByOne: items.filter(isSingle).sort((a, b) => rank(a) - rank(b)),
    together: items.filter((item) => !isSingle(item)),
    unanswered: open.length,
    missing: open.filter((item) => item.required).length,
    seeAgain: open.filter((item) => item.seeAgain).length,
    worst: worstOf(items),
  }
}

/** A closing sentence says "nothing found" and nothing of the past: what stands otherwise, or is disputed, is answered by itself. */
function needsOwnLook(item: WalkItem): boolean {
  if (!item.state) return false
  return ['advisory', 'fail', 'could-not-see'].includes(item.state.standing) || item.state.disagreement
}

function worstOf(items: readonly WalkItem[]): WalkPlace['worst'] {
  for (const standing of ['fail', 'could-not-see', 'advisory', 'ok'] as const)
    if (items.some((item) => item.state?.standing === standing)) return standing
  return 'none'
}
