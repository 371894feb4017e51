import * as z from 'zod/mini'
import { ROLES } from '@/lib/permissions/policy'

/** `typ` of the JWS that the server signs when it enrols a device (rule M2). */
export const CERTIFICATE_TYPE = 'lockwire-certificate'
/** Header that carries the certificate beside the request token, so that a restored server accepts the device again. */
export const CERTIFICATE_HEADER = 'x-device-certificate'

/** What the certificate says: this key, by this number, for these people, at this event. */
export const deviceCertificate = z.strictObject({
  v: z.literal(1),
  device: z.uuid(),
  event: z.uuid(),
  /** 0 is the server itself. */
  kid: z.int().check(z.gte(0), z.lte(255)),
  /** Raw Ed25519 public key, base64url. */
  publicKey: z.string().check(z.regex(/^[A-Za-z0-9_-]{43}$/)),
  deviceName: z.string().check(z.minLength(1), z.maxLength(60)),
  people: z
    .array(z.strictObject({ id: z.uuid(), name: z.string().check(z.minLength(1), z.maxLength(120)), roles: z.array(z.enum(ROLES)) }))

    // A tablet has a handful; the server's own names everybody of the office who ever acted through it.
    .check(z.minLength(1), z.maxLength(200)),
  /** Server time, ms. */
  issuedAt: z.int(),
})
export type DeviceCertificate = z.infer<typeof deviceCertificate>
