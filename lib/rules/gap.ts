import { undecided, type Fact, type Facts, type Judgement, type JudgementOutcome } from './judgement'

/** What a rule needs and was not given: *undecided*, naming the input. `figures` are what could be worked out all the same. */
export function missing(rule: string, input: string, figures: Facts = {}): Judgement {
  return undecided(`${rule}.missing`, { ...figures, missing: input })
}

/** A value that cannot be true, or is of the wrong kind: *undecided*, with what would be possible. */
export function impossible(rule: string, input: string, given: Fact, range: string): Judgement {
  return undecided(`${rule}.impossible-value`, { field: input, given, range })
}

/** The sentence for the two judgements above; null for any other. `names` says each input in plain words. */
export function explainGap({ code, facts }: Pick<Judgement, 'code' | 'facts'>, names: Readonly<Record<string, string>>): string | null {
  if (code.endsWith('.missing')) return `Not judged: ${nameOf(facts.missing, names)} is missing.`
  if (!code.endsWith('.impossible-value')) return null
  const given = facts.given === undefined || facts.given === null ? 'This' : String(facts.given)
  return `Not judged: ${given} is not possible for ${nameOf(facts.field, names)} (${String(facts.range ?? 'no range known')}).`
}

function nameOf(field: Fact | undefined, names: Readonly<Record<string, string>>): string {
  if (typeof field !== 'string' || field === '') return 'what was entered'
  return Object.hasOwn(names, field) ? (names[field] ?? field) : field
}

const SEVERITY: Readonly<Record<JudgementOutcome, number>> = { fail: 3, undecided: 2, advisory: 1, ok: 0 }

/** The most severe; the first of equals. A known fail outranks what is missing, and what is missing outranks every ok. */
export function worstOf(first: Judgement, ...others: readonly Judgement[]): Judgement {
  return others.reduce((worst, each) => (SEVERITY[each.outcome] > SEVERITY[worst.outcome] ? each : worst), first)
}
