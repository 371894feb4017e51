'use client'

import { type ChangeEvent, useId } from 'react'
import { buttonClass, type ButtonLook, type ButtonSize } from './button'
import { classNames } from './class-names'

export interface PhotoButtonProps {
  /** What it does, in words: “Take a photograph”. */
  readonly label: string
  readonly look?: ButtonLook
  readonly size?: ButtonSize
  /** A phone opens its camera at once; otherwise it also offers what it has. */
  readonly fromCamera?: boolean
  readonly isBusy?: boolean
  readonly disabled?: boolean
  readonly describedBy?: string
  readonly onPhoto: (file: File) => void
  readonly className?: string
}

/** A button that asks for a photograph. The same picture may be given again after it was taken away. */
export function PhotoButton({ label, look = 'secondary', size = 'normal', fromCamera = false, isBusy = false, ...rest }: PhotoButtonProps) {
  const { disabled = false, describedBy, onPhoto, className } = rest
  const id = useId()
  const isOff = disabled || isBusy
  function take(event: ChangeEvent<HTMLInputElement>): void {
    const file = event.target.files?.[0]
    // Emptied, or the browser would say nothing when the same file is chosen a second time.
    event.target.value = ''
    if (file) onPhoto(file)
  }
  return (
    <label
      htmlFor={id}
      data-slot="photo-button"
      aria-busy={isBusy || undefined}
      className={classNames(
        buttonClass(look, size),
        'relative',
        isOff
          ? 'cursor-not-allowed border-dashed border-muted bg-ground text-muted'
          : 'cursor-pointer has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-accent',
        className,
      )}
    >
      <CameraShape />
      {label}
      <input
        id={id}
        type="file"
        accept="image/*"
        {...(fromCamera ? { capture: 'environment' } : {})}
        disabled={isOff}
        aria-describedby={describedBy}
        onChange={take}
        className="sr-only"
      />
    </label>
  )
}

function CameraShape() {
  return (
    <svg viewBox="0 0 24 20" className="h-5 w-6 shrink-0" aria-hidden>
      <path d="M1.5 4.5h5l2-3h7l2 3h5v14h-21z" fill="none" stroke="currentColor" strokeWidth="2.2" />
      <circle cx="12" cy="11" r="4" fill="none" stroke="currentColor" strokeWidth="2.2" />
    </svg>
  )
}
