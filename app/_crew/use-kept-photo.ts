'use client'

import { useEffect, useState } from 'react'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'

/** A photograph's address for an `img`: from this device, else from the server while there is one. Null: not to be had; undefined: being looked for. */
export function useKeptPhoto(hash: string): string | null | undefined {
  const day = useDay()
  const isOffline = useDayStatus(day).link === 'offline'
  const [src, setSrc] = useState<string | null | undefined>(undefined)
  useEffect(() => {
    let [cancelled, made] = [false, '']
    void day.photos.read(hash).then((blob) => {
      if (cancelled) return
      if (blob !== null) made = URL.createObjectURL(blob)
      setSrc(blob === null ? null : made)
    })
    return () => {
      cancelled = true
      if (made !== '') URL.revokeObjectURL(made)
    }
    // Asked again when the server can be reached again: it may have what this device has not.
  }, [day, hash, isOffline])
  return src
}
