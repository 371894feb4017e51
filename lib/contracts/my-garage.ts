import * as z from 'zod/mini'
import { contract } from './contract'
import { figures } from './declaration'

const line = (what: string, max: number) =>
  z
    .string()
    .check(
      z.trim(),
      z.minLength(1, `Write ${what}.`),
      z.maxLength(max, `At most ${String(max)} letters, please.`),
      z.regex(/^[^\p{Cc}\p{Cf}\p{Zl}\p{Zp}]*$/u, 'Only letters that can be seen, please.'),
    )

const photoHash = z.nullable(z.string().check(z.regex(/^[0-9a-f]{64}$/)))
const saved = z.object({ id: z.string() })

export const carBody = z.strictObject({
  model: line('make and model', 80),
  colour: line('the colour', 40),
  plate: line('the plate, or the chassis number where it has none', 20),
  /** Facts by name, label values by `<check>/<field>`. */
  facts: figures,
})

/** `POST /api/my/cars`: adds a car of one's own. */
export const addCar = contract({
  name: 'car-add',
  method: 'POST',
  path: '/api/my/cars',
  auth: 'session',
  action: 'garage:keep',
  limitBytes: 40_000,
  rate: { times: 60, perSeconds: 60 },
  body: carBody,
  response: saved,
})

/** `PUT /api/my/cars/[car]`: what is known of a car of one's own, for next time. */
export const keepCar = contract({
  name: 'car-keep',
  method: 'PUT',
  path: '/api/my/cars/[car]',
  auth: 'session',
  action: 'garage:keep',
  limitBytes: 40_000,
  rate: { times: 120, perSeconds: 60 },
  params: z.strictObject({ car: z.uuid() }),
  body: z.strictObject({ facts: figures }),
  response: saved,
})

export const KIT_KINDS = ['helmet', 'head-restraint', 'suit', 'gloves', 'other'] as const
export type KitKind = (typeof KIT_KINDS)[number]

export const kitBody = z.strictObject({
  kind: z.enum(KIT_KINDS),
  name: line('a name by which you know it', 60),
  values: figures,
  photoHash,
  retired: z.boolean(),
})

/** `POST /api/my/kit`: adds a piece of kit. */
export const addKit = contract({
  name: 'kit-add',
  method: 'POST',
  path: '/api/my/kit',
  auth: 'session',
  action: 'garage:keep',
  limitBytes: 10_000,
  rate: { times: 60, perSeconds: 60 },
  body: kitBody,
  response: saved,
})

/** `PUT /api/my/kit/[kit]`: changes a piece of one's own kit, or puts it away. */
export const keepKit = contract({
  name: 'kit-keep',
  method: 'PUT',
  path: '/api/my/kit/[kit]',
  auth: 'session',
  action: 'garage:keep',
  limitBytes: 10_000,
  rate: { times: 120, perSeconds: 60 },
  params: z.strictObject({ kit: z.uuid() }),
  body: kitBody,
  response: saved,
})
