import * as z from 'zod/mini'
import { contract } from './contract'
import { declarationParts } from './declaration'

const params = z.strictObject({ entry: z.uuid() })
const LARGEST = 120_000

/** `PUT /api/my/entries/[entry]/draft`: keeps half a declaration for this person; nobody else sees it. */
export const saveDraft = contract({
  name: 'declaration-draft',
  method: 'PUT',
  path: '/api/my/entries/[entry]/draft',
  auth: 'session',
  action: 'entry:own',
  limitBytes: LARGEST,
  rate: { times: 240, perSeconds: 60 },
  params,
  body: z.strictObject({ parts: declarationParts }),
  response: z.object({ savedAt: z.int() }),
})

export const signBody = z.strictObject({
  parts: declarationParts,
  name: z
    .string()
    .check(
      z.trim(),
      z.minLength(2, 'Write your name: it is your signature.'),
      z.maxLength(80, 'A shorter name, please: at most 80 letters.'),
      z.regex(/^[^\p{Cc}\p{Cf}\p{Zl}\p{Zp}]*$/u, 'Only letters that can be seen, please.'),
    ),
  agrees: z.literal(true, { error: 'Tick that you agree before you sign.' }),
})

/** `POST /api/my/entries/[entry]/declaration`: signs what stands there as a new, immutable version. The very same again is no new one. */
export const signDeclaration = contract({
  name: 'declaration-sign',
  method: 'POST',
  path: '/api/my/entries/[entry]/declaration',
  auth: 'session',
  action: 'entry:own',
  limitBytes: LARGEST,
  rate: { times: 30, perSeconds: 60 },
  params,
  body: signBody,
  response: z.object({ version: z.int(), signedAt: z.int() }),
})
