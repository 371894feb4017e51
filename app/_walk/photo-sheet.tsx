'use client'

import { ProblemNotice } from '@/app/_crew/problem-notice'
import type { Taking } from '@/app/_crew/use-taking'
import { Button } from '@/app/_ui/button'
import { PhotoButton } from '@/app/_ui/photo-button'
import { Sheet } from '@/app/_ui/sheet'

interface PhotoSheetProps {
  /** What is to be seen on it. */
  readonly short: string
  readonly taking: Taking
  readonly onPhoto: (hash: string) => void
  readonly onWithout: () => void
  readonly onClose: () => void
}

/** Asks for the photograph that the checklist wants with this answer. Without one the answer is recorded all the same, and says so. */
export function PhotoSheet({ short, taking, onPhoto, onWithout, onClose }: PhotoSheetProps) {
  return (
    <Sheet isOpen title={`Show it: ${short}`} onClose={onClose}>
      <p>This check asks for a photograph. It is recorded as soon as you have taken it.</p>
      <ProblemNotice problem={taking.problem} className="mt-3" />
      <div className="mt-4 grid gap-3">
        <PhotoButton
          label={taking.busy ? 'Keeping it …' : 'Take a photograph'}
          look="primary"
          size="large"
          fromCamera
          isBusy={taking.busy}
          onPhoto={(file) => taking.take(file, onPhoto)}
        />
        <Button look="secondary" size="large" disabled={taking.busy} onClick={onWithout}>
          No photograph can be taken
        </Button>
        <Button look="quiet" disabled={taking.busy} onClick={onClose}>
          Back to the check
        </Button>
      </div>
    </Sheet>
  )
}
