import * as z from 'zod/mini'

const scalar = z.union([z.string().check(z.maxLength(200)), z.number(), z.boolean(), z.null()])
const key = z.string().check(z.minLength(1), z.maxLength(160))
const photoHash = z.string().check(z.regex(/^[0-9a-f]{64}$/))

/** Values by the id of a field or the name of a fact. */
export const figures = z.record(z.string().check(z.maxLength(60)), scalar)
export type Figures = z.infer<typeof figures>

/** What is declared of a car and of the kit of those who sit in it. What is absent was not said. */
export const declarationParts = z.strictObject({
  /** Facts of the car, by name. */
  facts: figures,
  /** Values by check; for a person's kit `<check>@<person>` (`declaredKey`). */
  answers: z.record(key, figures),
  /** What was changed on the car since last time, in the entrant's own words. */
  changes: z.string().check(z.maxLength(2_000)),
  /** Photographs of labels, by the same key as the answer. */
  photos: z.record(key, z.array(photoHash).check(z.maxLength(6))),
})
export type DeclarationParts = z.infer<typeof declarationParts>

export const NOTHING_DECLARED: DeclarationParts = { facts: {}, answers: {}, changes: '', photos: {} }

/** What the signer agrees to; it stands in the declaration, so that it can be read years later. */
export const DECLARATION_WORDS =
  'What I declare here is true as far as I know. I am responsible for the condition of this car and this kit, I will say what changes before I drive, and I know that only a look at the car passes it.'

/** A signed declaration as its row holds it. */
export const signedDeclaration = z.object({
  parts: declarationParts,
  /** The checklist and limits it was asked under. */
  checklist: z.string(),
  limits: z.string(),
  signedBy: z.object({ accountId: z.string(), name: z.string() }),
  words: z.string(),
})
export type SignedDeclaration = z.infer<typeof signedDeclaration>

/** Reads the body of a declaration's row; nothing declared where another version wrote what this one cannot read. */
export function partsOf(body: unknown): DeclarationParts {
  const read = signedDeclaration.safeParse(body)
  return read.success ? read.data.parts : NOTHING_DECLARED
}
