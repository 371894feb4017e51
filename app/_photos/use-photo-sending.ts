'use client'

import { useState } from 'react'
import { isPhotoProblem, type PhotoProblem, preparePhoto, type PreparedPhoto } from '@/lib/photos/prepare-photo'
import { sendPhoto } from '@/lib/photos/send-photo'

export interface PhotoSending {
  readonly state: 'idle' | 'preparing' | 'sending'
  /** What went wrong the last time; null when nothing did. */
  readonly problem: PhotoProblem | null
  readonly take: (file: File) => void
  /** Sends once more what is prepared; null when there is nothing that waits. */
  readonly again: (() => void) | null
}

/** Prepares a photograph on this device and sends it by the sign-in; `onKept` is told its hash once the server has it. */
export function usePhotoSending(onKept: (hash: string) => void): PhotoSending {
  const [state, setState] = useState<PhotoSending['state']>('idle')
  const [problem, setProblem] = useState<PhotoProblem | null>(null)
  const [waits, setWaits] = useState<PreparedPhoto | null>(null)

  async function send(photo: PreparedPhoto): Promise<void> {
    setState('sending')
    const sent = await sendPhoto(photo)
    setState('idle')
    setWaits(sent.ok ? null : photo)
    setProblem(sent.ok ? null : { ...sent.problem, kept: 'The photograph is still on this page.' })
    if (sent.ok) onKept(photo.hash)
  }

  async function take(file: File): Promise<void> {
    setState('preparing')
    setProblem(null)
    const prepared = await preparePhoto(file)
    if (!isPhotoProblem(prepared)) return send(prepared)
    setState('idle')
    setProblem(prepared)
  }

  return {
    state,
    problem,
    take: (file) => void take(file),
    again: waits === null ? null : () => void send(waits),
  }
}
