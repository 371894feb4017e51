'use client'

import { useEffect, useRef, useState } from 'react'
import { isPhotoProblem, type PhotoProblem, preparePhoto } from '@/lib/photos/prepare-photo'
import { dayProblemOf } from '@/lib/sync/client/day-problem'
import { useDay } from './day-context'

export interface Taking {
  readonly busy: boolean
  /** What went wrong the last time; null when nothing did. */
  readonly problem: PhotoProblem | null
  /** Makes it small and keeps it on this device; `onKept` is told its hash once it is on the disk (rule M1). */
  readonly take: (file: File, onKept: (hash: string) => void) => void
  /** Takes one away again; one that a record names stays. */
  readonly drop: (hash: string) => void
}

/** Taking photographs on a crew device, with no network needed. One that comes too late, its screen being gone, is not kept. */
export function useTaking(): Taking {
  const day = useDay()
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState<PhotoProblem | null>(null)
  const [bug, setBug] = useState<{ readonly error: unknown } | null>(null)
  // Thrown while rendering, so that the boundary shows it instead of a camera that silently did nothing.
  if (bug) throw bug.error
  const isHere = useRef(true)
  useEffect(() => {
    isHere.current = true
    return () => {
      isHere.current = false
    }
  }, [])

  async function keep(file: File, onKept: (hash: string) => void): Promise<void> {
    const prepared = await preparePhoto(file)
    if (isPhotoProblem(prepared)) {
      setProblem(prepared)
      return
    }
    await day.photos.keep({ hash: prepared.hash, bytes: new Uint8Array(await prepared.blob.arrayBuffer()) })
    if (isHere.current) onKept(prepared.hash)
    else await day.photos.drop(prepared.hash)
  }

  async function attempt(work: () => Promise<void>): Promise<void> {
    setBusy(true)
    setProblem(null)
    try {
      await work()
    } catch (error) {
      const known = dayProblemOf(error)
      if (known) setProblem(known)
      else setBug({ error })
    } finally {
      setBusy(false)
    }
  }

  return {
    busy,
    problem,
    take: (file, onKept) => void attempt(() => keep(file, onKept)),
    drop: (hash) => void attempt(() => day.photos.drop(hash)),
  }
}
