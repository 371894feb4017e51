'use client'

import { useState } from 'react'
import { Button } from './button'
import { classNames } from './class-names'
import { Dialog } from './dialog'

export interface PhotoThumbProps {
  /** Where the picture is read from; null while it is being looked for. */
  readonly src: string | null
  /** What it shows: “front left tyre, fail”. Read out, and the title of the large picture. */
  readonly words: string
  /** Why there is no picture, where there is none. */
  readonly missing?: string
  /** `small`: on a crew screen, where the answers need the room. */
  readonly size?: 'small' | 'normal'
  /** Takes it away again; offered beside the large picture. */
  readonly onRemove?: () => void
  readonly className?: string
}

/** A small photograph; pressed, it is shown large. One that cannot be had says so in words. */
export function PhotoThumb({
  src,
  words,
  missing = 'Photograph not to be had here',
  size = 'normal',
  onRemove,
  className,
}: PhotoThumbProps) {
  const [isOpen, setOpen] = useState(false)
  const [broken, setBroken] = useState<string | null>(null)
  const box = classNames(
    size === 'small' ? 'size-16' : 'size-24',
    'shrink-0 overflow-hidden rounded-sm border-2 border-line bg-surface',
    className,
  )
  if (src === null || broken === src) {
    return (
      <span
        data-slot="photo-thumb"
        className="inline-grid min-h-16 max-w-40 place-items-center rounded-sm border-2 border-dashed border-muted bg-surface px-2 text-center text-sm text-muted"
      >
        {missing}
      </span>
    )
  }
  return (
    <>
      <button data-slot="photo-thumb" type="button" className={box} aria-label={`Photograph: ${words}`} onClick={() => setOpen(true)}>
        <Picture src={src} words="" className="size-full object-cover" onBroken={() => setBroken(src)} />
      </button>
      <Dialog
        isOpen={isOpen}
        onClose={() => setOpen(false)}
        title={words}
        actions={
          <>
            <Button onClick={() => setOpen(false)}>Close</Button>
            {onRemove && (
              <Button look="secondary" onClick={onRemove}>
                Take it away
              </Button>
            )}
          </>
        }
      >
        <Picture src={src} words={words} className="max-h-[70dvh] w-full object-contain" onBroken={() => setBroken(src)} />
      </Dialog>
    </>
  )
}

interface PictureProps {
  readonly src: string
  readonly words: string
  readonly className: string
  readonly onBroken: () => void
}

function Picture({ src, words, className, onBroken }: PictureProps) {
  // eslint-disable-next-line @next/next/no-img-element -- the optimiser is off on purpose, and a picture of this device's own has no address
  return <img src={src} alt={words} className={className} onError={onBroken} />
}
