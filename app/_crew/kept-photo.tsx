'use client'

import { PhotoThumb } from '@/app/_ui/photo-thumb'
import { useKeptPhoto } from './use-kept-photo'

interface KeptPhotoProps {
  readonly hash: string
  /** What it shows: “thinner pad, fail”. */
  readonly words: string
  /** Takes it away again, where it may be. */
  readonly onRemove?: () => void
}

/** A photograph on a crew screen: from this device's own store at once, else from the server. */
export function KeptPhoto({ hash, words, onRemove }: KeptPhotoProps) {
  const src = useKeptPhoto(hash)
  const missing = src === undefined ? 'Looking …' : 'Not on this device'
  return <PhotoThumb src={src ?? null} words={words} missing={missing} size="small" {...(onRemove ? { onRemove } : {})} />
}
