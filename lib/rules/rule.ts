import type * as z from 'zod/mini'
import type { CivilDate } from './civil-date'
import type { Judgement, Source } from './judgement'

/**
 * One thing judged. `inputs` and `params` are zod/mini schemas (inputs all optional: missing is *undecided*, never ok);
 * `evaluate` is pure and total: it never throws for inputs its schema accepts. Dated kit is judged on `on`, the event's last day.
 */
export interface Rule<I extends z.ZodMiniType = z.ZodMiniType, P extends z.ZodMiniType = z.ZodMiniType> {
  readonly name: string
  readonly title: string
  readonly inputs: I
  readonly params: P
  /** A complete params set for a track day: what a checklist starts from. `judge` never falls back to it by itself. */
  readonly defaults: z.infer<P>
  readonly source: readonly Source[]
  readonly evaluate: (inputs: z.infer<I>, params: z.infer<P>, on: CivilDate) => Judgement
  /** One plain sentence for a judgement of this rule, figures included ("0.9 mm under 1.6 mm"); total, whatever the facts hold. */
  readonly explain: (judgement: Pick<Judgement, 'code' | 'facts'>) => string
}

/** Declares a rule with its types inferred from its schemas. */
export function rule<I extends z.ZodMiniType, P extends z.ZodMiniType>(definition: Rule<I, P>): Rule<I, P> {
  return definition
}
