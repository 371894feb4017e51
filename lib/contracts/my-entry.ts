import * as z from 'zod/mini'
import { PRE_CHECKS } from '@/lib/checklist/pre-check'
import { VERDICTS } from '@/lib/inspection/state'
import { WIRE_STATES } from './board'
import { contract } from './contract'

const source = z.object({
  title: z.string(),
  edition: z.optional(z.string()),
  where: z.optional(z.string()),
  confidence: z.string(),
})

/** Something that is not as it should be: as declared, or as it was seen. */
const toMend = z.object({
  key: z.string(),
  /** Whose: a person's name, or null for the car. */
  whose: z.nullable(z.string()),
  place: z.string(),
  /** What is seen when it is right. */
  prompt: z.string(),
  weight: z.enum(['fail', 'advisory']),
  /** The figure that decided and its limit, or the reason that was given. */
  words: z.string(),
  bring: z.string(),
  source: z.array(source),
})
export type ToMend = z.infer<typeof toMend>

const myPerson = z.object({
  id: z.string(),
  name: z.string(),
  role: z.enum(['driver', 'passenger', 'instructor']),
  isMe: z.boolean(),
  verdict: z.enum(VERDICTS),
  band: z.nullable(z.string()),
})

/** `GET /api/my/entries/[entry]`: how one's own entry stands now. Anybody else's is missing. */
export const myEntry = contract({
  name: 'my-entry',
  method: 'GET',
  path: '/api/my/entries/[entry]',
  auth: 'session',
  action: 'entry:own',
  limitBytes: 0,
  rate: { times: 240, perSeconds: 60 },
  params: z.strictObject({ entry: z.uuid() }),
  response: z.object({
    at: z.int(),
    id: z.string(),
    /** What the bay's camera reads. It opens nothing. */
    codeText: z.string(),
    number: z.string(),
    plate: z.string(),
    model: z.string(),
    colour: z.string(),
    group: z.string(),
    withdrawn: z.boolean(),
    event: z.object({ name: z.string(), venue: z.string(), firstDay: z.string(), lastDay: z.string(), timeZone: z.string() }),
    /** Venue day now, and whether the event is on, over or still to come. */
    day: z.string(),
    when: z.enum(['before', 'on', 'over']),
    /** The group's next session from now, and when the bay calls its group if there is an order. */
    nextSessionAt: z.nullable(z.int()),
    callUp: z.nullable(z.object({ from: z.int(), to: z.int() })),
    people: z.array(myPerson),
    /** Whether this person may declare: a driver of the entry, while the event is not over. */
    mayDeclare: z.boolean(),
    declaration: z.object({
      state: z.enum(['none', 'draft', 'signed']),
      version: z.nullable(z.int()),
      signedAt: z.nullable(z.int()),
      signedBy: z.nullable(z.string()),
      draftAt: z.nullable(z.int()),
    }),
    preCheck: z.object({ says: z.enum(PRE_CHECKS), answered: z.int(), asked: z.int() }),
    verdict: z.enum(VERDICTS),
    isPresented: z.boolean(),
    hasLivePass: z.boolean(),
    /** Why it is held, in words; empty when it is not. */
    held: z.array(z.string()),
    bolts: z.array(z.object({ label: z.string(), state: z.enum(WIRE_STATES) })),
    sentence: z.string(),
    /** What to mend: as declared before anybody has looked, as seen from then on. */
    mend: z.array(toMend),
  }),
})
export type MyEntry = z.infer<typeof myEntry.response>
