/** How far a source can be trusted, as shown to people: read in the rule-maker's own text, repeated second-hand, remembered, custom of the trade, or our own default. */
export type Confidence = 'quoted' | 'second-hand' | 'from memory: confirm' | 'common practice' | 'ours'

/** Where a limit or a fact of the trade comes from. `edition` is the year or version that was read; `where` the article or page. */
export interface Source {
  readonly id: string
  readonly title: string
  readonly edition?: string
  readonly where?: string
  readonly confidence: Confidence
}

/** One figure that decided, already in the unit its name carries (`angleDeg`, `limitMm`). */
export type Fact = number | string | boolean | null
export type Facts = Readonly<Record<string, Fact>>

export type JudgementOutcome = 'ok' | 'advisory' | 'fail' | 'undecided'

/**
 * What a rule says of one set of inputs. `code` is stable (`harness-angle.over-limit`) and turned into words by the screen;
 * `facts` carry the figures that decided; `source` the grounds.
 */
export interface Judgement {
  readonly outcome: JudgementOutcome
  readonly code: string
  readonly facts: Facts
}

/** Nothing found against the car or kit. */
export function ok(code: string, facts: Facts = {}): Judgement {
  return { outcome: 'ok', code, facts }
}

/** May run with a note. */
export function advisory(code: string, facts: Facts = {}): Judgement {
  return { outcome: 'advisory', code, facts }
}

/** May not run until it is put right and seen again. */
export function fail(code: string, facts: Facts = {}): Judgement {
  return { outcome: 'fail', code, facts }
}

/** Something needed is missing; never an ok. */
export function undecided(code: string, facts: Facts = {}): Judgement {
  return { outcome: 'undecided', code, facts }
}
