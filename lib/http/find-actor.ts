import 'server-only'
import type { Contract } from '@/lib/contracts/contract'
import { CERTIFICATE_HEADER } from '@/lib/contracts/device-certificate'
import type { Actor } from '@/lib/platform/actor'
import { deviceOfRequest } from '@/lib/platform/device-token'
import { isRefusal, type Refusal, refuse } from '@/lib/platform/refusal'
import type { Db } from '@/lib/platform/served-database'
import { accountOfCookie } from '@/lib/platform/session'
import { sha256 } from '@/lib/platform/sha256'
import { deviceTokenOf } from './check-origin'

/** Who asks, as the contract lets them show it: a device token, a sign-in's cookie, or nobody where anybody may. */
export async function findActor(
  request: Request,
  contract: Contract,
  body: Uint8Array,
  database: Db,
  now: number,
): Promise<Actor | Refusal> {
  const token = contract.auth === 'device' || contract.auth === 'either' ? deviceTokenOf(request) : null
  if (token !== null) return findDevice(request, contract, token, body, database, now)
  if (contract.auth === 'device') return refuse('device-not-known')
  const account = await accountOfCookie(database, request.headers.get('cookie') ?? '')
  if (account) return account
  return contract.auth === 'public' ? { kind: 'nobody' } : refuse('not-signed-in')
}

function findDevice(request: Request, contract: Contract, token: string, body: Uint8Array, database: Db, now: number): Actor | Refusal {
  const url = new URL(request.url)
  const certificate = request.headers.get(CERTIFICATE_HEADER)
  const signed = { token, certificate, method: request.method, path: url.pathname + url.search, bodyHash: sha256(body) }
  const device = deviceOfRequest(database, signed, now)
  if (isRefusal(device) || device.state === 'active' || contract.evenRetired) return device
  return refuse('device-retired')
}
