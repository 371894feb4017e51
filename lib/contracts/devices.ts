import * as z from 'zod/mini'
import { ROLES } from '@/lib/permissions/policy'
import { contract } from './contract'

/**
 * Enrols a device for its person: by the sign-in of somebody who holds a crew role at the event, or by the claim of an accepted joiner.
 * The same key asked for again gets the same device and number, so a lost answer is no harm.
 */
export const enrolDevice = contract({
  name: 'device-enrol',
  method: 'POST',
  path: '/api/devices',
  auth: 'public',
  action: 'public',
  limitBytes: 2_048,
  rate: { times: 20, perSeconds: 60 },
  body: z.strictObject({
    event: z.uuid(),
    name: z.string().check(z.trim(), z.minLength(1, 'Give the device a name.'), z.maxLength(60)),
    /** Raw Ed25519 public key, base64url. */
    publicKey: z.string().check(z.regex(/^[A-Za-z0-9_-]{43}$/)),
    /** From joining; left out by who is signed in. */
    claim: z.optional(z.string().check(z.regex(/^[A-Za-z0-9_-]{20,64}$/))),
  }),
  response: z.object({
    device: z.string(),
    kid: z.int(),
    certificate: z.string(),
    /** Raw Ed25519 public key of the club's server (kid 0), base64url. */
    serverPublicKey: z.string(),
    people: z.array(z.object({ id: z.string(), name: z.string(), roles: z.array(z.enum(ROLES)) })),
    serverTime: z.int(),
  }),
})

export const deviceView = z.object({
  id: z.string(),
  kid: z.int(),
  name: z.string(),
  state: z.enum(['active', 'retired', 'lost']),
  people: z.array(z.object({ name: z.string(), roles: z.array(z.enum(ROLES)) })),
  enrolledAt: z.int(),
  lastContactAt: z.nullable(z.int()),
  /** Records it still held unsent, by its own word at its last contact; null: it never said. */
  unsent: z.nullable(z.int()),
})
export type DeviceView = z.infer<typeof deviceView>

const params = z.strictObject({ event: z.uuid() })

export const listDevices = contract({
  name: 'device-list',
  method: 'GET',
  path: '/api/events/[event]/devices',
  auth: 'session',
  action: 'crew:see',
  limitBytes: 0,
  rate: { times: 240, perSeconds: 60 },
  params,
  response: z.object({ devices: z.array(deviceView) }),
})

/** Takes a device out of use: what it recorded until now stands (rule T2). Lost: nothing permitting that comes later does. */
export const retireDevice = contract({
  name: 'device-retire',
  method: 'POST',
  path: '/api/events/[event]/devices/retire',
  auth: 'session',
  action: 'device:retire',
  limitBytes: 1_024,
  rate: { times: 60, perSeconds: 60 },
  params,
  body: z.strictObject({ device: z.uuid(), as: z.enum(['retired', 'lost']) }),
  response: deviceView,
})
