'use client'

import { PhotoThumb } from '@/app/_ui/photo-thumb'
import { photoPath } from '@/lib/photos/send-photo'

/** A photograph the server keeps, for online pages: whoever may not see it is told that it is not to be had. */
export function ServedPhoto({ hash, words }: { readonly hash: string; readonly words: string }) {
  return <PhotoThumb src={photoPath(hash)} words={words} missing="Not on the server yet" />
}
