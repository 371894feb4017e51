import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { device } from '@/db/schema'
import type { DeviceCertificate } from '@/lib/contracts/device-certificate'
import {
  DEVICE_TOKEN_LIFE_SECONDS,
  DEVICE_TOKEN_SKEW_SECONDS,
  DEVICE_TOKEN_TYPE,
  type DeviceToken,
  deviceToken,
} from '@/lib/contracts/device-token'
import type { DeviceActor } from './actor'
import { adoptDevice } from './adopt-device'
import { deviceActor } from './device-actor'
import { unverifiedPayload, verifyJws } from './jws'
import { readCertificate } from './read-certificate'
import { type Refusal, refuse } from './refusal'

/** The parts of a request that its token is bound to. */
export interface SignedRequest {
  readonly token: string
  /** From the certificate header; null when none was sent. */
  readonly certificate: string | null
  readonly method: string
  /** Path with query, as it came. */
  readonly path: string
  readonly bodyHash: string
}

/** The device that signed a request, or why it is not believed. A device this server has forgotten comes back by its certificate. */
export function deviceOfRequest(database: Db, request: SignedRequest, now: number): DeviceActor | Refusal {
  const claimed = deviceToken.safeParse(unverifiedPayload(request.token))
  if (!claimed.success) return refuse('device-token-wrong')
  const token = claimed.data
  const known = database
    .select({ publicKey: device.publicKey })
    .from(device)
    .where(and(eq(device.id, token.device), eq(device.eventId, token.event)))
    .get()
  const certificate = known ? null : certificateFor(database, request.certificate, token)
  const publicKey = known?.publicKey ?? certificate?.publicKey
  if (!publicKey) return refuse('device-not-known')
  // Only now are the claims worth anything: signed by the key of the device they name.
  if (verifyJws(request.token, DEVICE_TOKEN_TYPE, publicKey) === null) return refuse('device-token-wrong')
  const fault = tokenFault(token, request, now)
  if (fault) return fault
  if (certificate && !adoptDevice(database, certificate, request.certificate ?? '', now)) return refuse('device-not-known')
  return deviceActor(database, token.device) ?? refuse('device-not-known')
}

function tokenFault(token: DeviceToken, request: SignedRequest, now: number): Refusal | null {
  if (token.method !== request.method || token.path !== request.path || token.body !== request.bodyHash) return refuse('device-token-wrong')
  const seconds = now / 1000
  if (token.exp - token.iat > DEVICE_TOKEN_LIFE_SECONDS || token.exp < token.iat) return refuse('device-token-wrong')
  if (token.iat > seconds + DEVICE_TOKEN_SKEW_SECONDS || token.exp < seconds - DEVICE_TOKEN_SKEW_SECONDS) return refuse('device-token-late')
  return null
}

function certificateFor(database: Db, jws: string | null, token: DeviceToken): DeviceCertificate | null {
  const says = jws === null ? null : readCertificate(database, token.event, jws)
  return says?.device === token.device ? says : null
}
