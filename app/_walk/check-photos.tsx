'use client'

import { KeptPhoto } from '@/app/_crew/kept-photo'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import type { Taking } from '@/app/_crew/use-taking'
import { PhotoButton } from '@/app/_ui/photo-button'

/** More than these say nothing more of one check. */
const MOST = 4

interface CheckPhotosProps {
  /** What they show, for who hears the screen. */
  readonly words: string
  readonly photos: readonly string[]
  readonly taking: Taking
  readonly disabled: boolean
  readonly onPhotos: (photos: readonly string[]) => void
  readonly onRemove: (hash: string) => void
}

/** The photographs that go with the answer, and the camera. They are on the device before anything is recorded. */
export function CheckPhotos({ words, photos, taking, disabled, onPhotos, onRemove }: CheckPhotosProps) {
  return (
    <div className="mt-4 grid gap-3">
      <div className="flex flex-wrap items-center gap-3">
        {photos.map((hash) => (
          <KeptPhoto key={hash} hash={hash} words={words} onRemove={() => onRemove(hash)} />
        ))}
        {photos.length < MOST && (
          <PhotoButton
            label={taking.busy ? 'Keeping it …' : photos.length === 0 ? 'Photograph' : 'One more'}
            fromCamera
            isBusy={taking.busy}
            disabled={disabled}
            onPhoto={(file) => taking.take(file, (hash) => onPhotos([...photos.filter((one) => one !== hash), hash]))}
          />
        )}
      </div>
      <ProblemNotice problem={taking.problem} />
    </div>
  )
}
