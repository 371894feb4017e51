import 'server-only'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { putPhoto } from '@/lib/contracts/photos'
import type { AccountActor, DeviceActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { sha256 } from '@/lib/platform/sha256'
import { servedPhotoStore } from '../served-photo-store'
import { keepPhoto, type PhotoOwner } from './keep-photo'

/** Keeps what was sent under the hash of what was sent; a second time changes nothing (rule S9). */
export async function keepSentPhoto(
  { params }: InputOf<typeof putPhoto>,
  bytes: Uint8Array,
  actor: AccountActor | DeviceActor,
  { database, now }: Pick<Deps, 'database' | 'now'>,
): Promise<OutputOf<typeof putPhoto> | Refusal> {
  if (bytes.byteLength === 0) return refuse('photo-not-one')
  if (sha256(bytes) !== params.hash) return refuse('photo-other-hash')
  const kept = await keepPhoto(database, servedPhotoStore(), bytes, ownerOf(actor), now)
  if (kept === 'busy') return refuse('busy', { what: 'Too many photographs arrived at once.', retryAfterSeconds: 3 })
  return typeof kept === 'string' ? refuse(kept) : kept
}

function ownerOf(actor: AccountActor | DeviceActor): PhotoOwner {
  return actor.kind === 'device'
    ? { clubId: actor.clubId, eventId: actor.eventId, accountId: null, deviceId: actor.deviceId }
    : { clubId: actor.clubId, eventId: null, accountId: actor.accountId, deviceId: null }
}
