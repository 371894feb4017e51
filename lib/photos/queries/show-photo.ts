import 'server-only'
import { and, eq } from 'drizzle-orm'
import { photo } from '@/db/schema'
import type { InputOf } from '@/lib/contracts/contract'
import type { getPhoto } from '@/lib/contracts/photos'
import type { AccountActor, DeviceActor } from '@/lib/platform/actor'
import type { Deps, FileAnswer } from '@/lib/platform/command'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { servedPhotoStore } from '../served-photo-store'
import { maySeePhoto } from './may-see-photo'

/** The photograph, to who may see it; to anybody else it is not there, as one that never was. */
export async function showPhoto(
  { params }: InputOf<typeof getPhoto>,
  actor: AccountActor | DeviceActor,
  { database }: Pick<Deps, 'database'>,
): Promise<FileAnswer | Refusal> {
  const row = database
    .select()
    .from(photo)
    .where(and(eq(photo.hash, params.hash), eq(photo.clubId, actor.clubId)))
    .get()
  if (!row || !maySeePhoto(database, row, actor)) return refuse('missing')
  const bytes = await servedPhotoStore().get(row.storedHash)
  return bytes === null ? refuse('missing') : { bytes, type: 'image/jpeg', saveAs: null, etag: row.storedHash }
}
