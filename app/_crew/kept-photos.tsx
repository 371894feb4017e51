'use client'

import type { AnyRecord } from '@/lib/inspection/record'
import { KeptPhoto } from './kept-photo'

/** The photographs of a record, in a row; nothing where it has none. */
export function KeptPhotos({ record, words }: { readonly record: AnyRecord; readonly words: string }) {
  const hashes = 'photos' in record ? (record.photos ?? []) : []
  if (hashes.length === 0) return null
  return (
    <span className="mt-2 flex flex-wrap gap-2">
      {hashes.map((hash) => (
        <KeptPhoto key={hash} hash={hash} words={words} />
      ))}
    </span>
  )
}
