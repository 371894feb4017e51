import * as z from 'zod/mini'
import { conditionSchema } from './condition'

const slug = z.string().check(z.regex(/^[a-z0-9]+(-[a-z0-9]+)*$/))
const checkId = z.string().check(z.regex(/^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+(-[a-z0-9]+)*)+$/))
const words = z.string().check(z.minLength(2), z.maxLength(400))

export const DEPTHS = ['look-over', 'standard', 'full'] as const
/** How deep a walk-round looks; each asks all that the ones before it ask. */
export type Depth = (typeof DEPTHS)[number]

const sourceSchema = z.strictObject({
  id: z.string(),
  title: z.string(),
  edition: z.optional(z.string()),
  where: z.optional(z.string()),
  confidence: z.enum(['quoted', 'second-hand', 'from memory: confirm', 'common practice', 'ours']),
})

/** One value the walk asks for: a number with its unit and the range that is possible at all, a text such as a date code, or one of a list. */
const measureFieldSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('number'),
    id: z.string(),
    label: words,
    unit: z.string(),
    min: z.number(),
    max: z.number(),
    decimals: z.number(),
  }),
  z.strictObject({ kind: z.literal('text'), id: z.string(), label: words, maxLength: z.number(), hint: z.optional(z.string()) }),
  z.strictObject({
    kind: z.literal('choice'),
    id: z.string(),
    label: words,
    options: z.array(z.strictObject({ id: z.string(), label: z.string() })).check(z.minLength(2)),
  }),
])
export type MeasureField = z.infer<typeof measureFieldSchema>

/** Where a rule's input comes from: a value measured at this check, a pinned fact, or a constant of the check. */
const ruleInputSchema = z.union([
  z.strictObject({ measure: z.string() }),
  z.strictObject({ fact: z.string() }),
  z.strictObject({ value: z.union([z.string(), z.number(), z.boolean()]) }),
])

const reasonSchema = z.strictObject({ id: slug, text: words })

export const checkSchema = z.strictObject({
  id: checkId,
  subject: z.enum(['car', 'person', 'fit']),
  station: slug,
  /** Where the walk asks it; a list makes one check per place, its id ending in `.<place>` (the four corners). */
  place: z.union([slug, z.array(slug).check(z.minLength(2))]),
  /** What is seen when it is right, as the answer says it. */
  prompt: words,
  how: words,
  /** What the closing sentence of a place names: "nuts", "caliper". */
  short: words,
  critical: z.boolean(),
  standing: z.boolean(),
  /** The shallowest depth that asks it. */
  depth: z.enum(DEPTHS),
  required: z.boolean(),
  applies: z.optional(conditionSchema),
  naMeans: z.optional(words),
  measure: z.optional(z.array(measureFieldSchema).check(z.minLength(1))),
  rule: z.optional(
    z.strictObject({
      name: slug,
      inputs: z.record(z.string(), ruleInputSchema),
      params: z.optional(z.record(z.string(), z.unknown())),
    }),
  ),
  photo: z.optional(z.enum(['on-fail', 'always'])),
  reasons: z.array(reasonSchema).check(z.minLength(1)),
  /** Ids of the checks a repair here disturbs; for a check per corner, of the same corner unless the id names its place. */
  reopens: z.array(checkId),
  tags: z.optional(z.array(z.enum(['wet', 'passenger']))),
  source: z.optional(z.array(sourceSchema)),
})

export const factSchema = z.strictObject({
  name: z.string().check(z.regex(/^[a-zA-Z][a-zA-Z0-9]*$/)),
  subject: z.enum(['car', 'person', 'fit']),
  label: words,
  /** When the first screen asks it at all ("head restraint?" only with a harness). */
  applies: z.optional(conditionSchema),
  values: z.array(z.strictObject({ value: z.union([z.string(), z.boolean(), z.number()]), label: words })).check(z.minLength(2)),
})

export const stationSchema = z.strictObject({ id: slug, title: words, short: words, subject: z.enum(['car', 'person', 'fit']) })
export const placeSchema = z.strictObject({ id: slug, title: words, subject: z.enum(['car', 'person', 'fit']), stand: words })

export const holdReasonSchema = z.strictObject({
  id: slug,
  text: words,
  subject: z.enum(['car', 'person']),
  stations: z.array(slug),
  /** Checks as the walk asks them: of a check per corner each corner is named. */
  checks: z.array(checkId),
})

export const checklistSchema = z.strictObject({
  id: slug,
  version: z.int().check(z.gte(1)),
  title: words,
  kindOfDay: z.enum(['closed-circuit', 'public-road']),
  /** The facts that conditions may read, with their possible values, in the order the first screen of a walk asks them. */
  facts: z.array(factSchema),
  stations: z.array(stationSchema),
  /** In the order of the walk. */
  places: z.array(placeSchema),
  checks: z.array(checkSchema),
  /** Why something may be held, and what is to be seen again then. */
  holdReasons: z.array(holdReasonSchema),
})

/** A published checklist, exactly as its file holds it. */
export type Checklist = z.infer<typeof checklistSchema>
export type CheckDefinition = Checklist['checks'][number]
export type Station = Checklist['stations'][number]
export type Place = Checklist['places'][number]
export type HoldReason = Checklist['holdReasons'][number]
export type FactDefinition = Checklist['facts'][number]
/** What a check, a station or a place belongs to. */
export type JudgedKind = CheckDefinition['subject']

/** A check as the walk asks it: one place, ids of its corner filled in. */
export type Check = Omit<CheckDefinition, 'place'> & { readonly place: string }

/** A set of limits, by rule name; it replaces a check's own `params` key by key and can change nothing else. */
export const limitsSchema = z.strictObject({
  id: slug,
  version: z.int().check(z.gte(1)),
  title: words,
  rules: z.record(slug, z.record(z.string(), z.unknown())),
})
export type Limits = z.infer<typeof limitsSchema>
