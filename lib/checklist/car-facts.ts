/**
 * What is pinned about a car, a person's kit or a fit, by the name a condition reads: `belts: 'harness'`, `roof: 'open'`, `headRestraint: true`.
 * A name that is absent is *not known*. Which names and values exist is said by the checklist's own `facts`.
 */
export type CarFacts = Readonly<Record<string, string | number | boolean | null>>
