import { putPhoto, type PhotoView } from '@/lib/contracts/photos'
import { type Called, upload } from '@/lib/http/call'
import type { PreparedPhoto } from './prepare-photo'

/** Sends a prepared photograph by the sign-in's cookie; again is no harm. Crew devices do not use this: their day sends by itself. */
export function sendPhoto({ hash, blob }: PreparedPhoto): Promise<Called<PhotoView>> {
  return upload(putPhoto, { params: { hash } }, blob)
}

/** Where a kept photograph is shown from, for the crew and organisers of its event and for who put it there. */
export function photoPath(hash: string): string {
  return `/api/photos/${hash}`
}
