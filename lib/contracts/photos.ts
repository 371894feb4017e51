import * as z from 'zod/mini'
import { contract, FILE } from './contract'

/** Longest side of a photograph as it is kept, px. */
export const PHOTO_LONGEST_PX = 1600
/** Largest that is taken at all, bytes; phones send much less (`preparePhoto`). */
export const PHOTO_LIMIT_BYTES = 10_000_000

const params = z.strictObject({ hash: z.string().check(z.regex(/^[0-9a-f]{64}$/)) })

export const photoView = z.strictObject({
  /** SHA-256 of what was sent: what records and declarations name. */
  hash: z.string(),
  /** Of what is kept, re-encoded: px and bytes. */
  width: z.int(),
  height: z.int(),
  bytes: z.int(),
})
export type PhotoView = z.infer<typeof photoView>

/**
 * `PUT /api/photos/[hash]` with a JPEG, PNG or WebP as its whole body, named by its SHA-256 (rule S9). Sent again it is the same photograph.
 * From a crew device it belongs to the device's event, from a sign-in to the account.
 */
export const putPhoto = contract({
  name: 'photo-put',
  method: 'PUT',
  path: '/api/photos/[hash]',
  auth: 'either',
  action: 'photo:put',
  // As with records: what a fail shows must still arrive after the tablet was retired.
  evenRetired: true,
  limitBytes: PHOTO_LIMIT_BYTES,
  rate: { times: 240, perSeconds: 60 },
  params,
  response: photoView,
})

/** `GET /api/photos/[hash]`: a JPEG without metadata, for the crew and organisers of its event and whoever put it there. */
export const getPhoto = contract({
  name: 'photo-get',
  method: 'GET',
  path: '/api/photos/[hash]',
  auth: 'either',
  // Who may see it depends on whose it is; the command asks POLICY (`photo:see`) at the photograph's own event.
  action: 'public',
  limitBytes: 0,
  rate: { times: 1_200, perSeconds: 60 },
  params,
  response: FILE,
})
