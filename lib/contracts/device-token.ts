import * as z from 'zod/mini'

/** `typ` of the JWS a device signs for each request; sent as `Authorization: Device <jws>` (rule S5). */
export const DEVICE_TOKEN_TYPE = 'lockwire-request'
/** Longest life of a request token, seconds; and how far the device's idea of server time may be out. */
export const DEVICE_TOKEN_LIFE_SECONDS = 60
export const DEVICE_TOKEN_SKEW_SECONDS = 60

/** Binds a signature to one request: nobody who reads it can send anything else with it. */
export const deviceToken = z.strictObject({
  device: z.uuid(),
  event: z.uuid(),
  method: z.enum(['GET', 'POST', 'PUT', 'PATCH', 'DELETE']),
  /** Path with its query, as sent: `/api/sync/pull?event=…`. */
  path: z.string().check(z.maxLength(2048)),
  /** Seconds since the epoch, by the device's clock corrected to server time. */
  iat: z.int(),
  exp: z.int(),
  /** SHA-256 of the body's bytes, hex; of no bytes where there is no body. */
  body: z.string().check(z.regex(/^[0-9a-f]{64}$/)),
})
export type DeviceToken = z.infer<typeof deviceToken>
