'use client'

import type { ReactNode } from 'react'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { Sheet } from '@/app/_ui/sheet'

interface ChiefSheetProps {
  readonly title: string
  /** What pressing the button says, in words. */
  readonly does: string
  readonly isReady: boolean
  readonly save: () => Promise<unknown>
  readonly onClose: () => void
  readonly children: ReactNode
}

/** One act of the chief: its words, and one button that saves it or says why not. What was written stays until it is saved. */
export function ChiefSheet({ title, does, isReady, save, onClose, children }: ChiefSheetProps) {
  const { busy, problem, act } = useAction()
  return (
    <Sheet isOpen title={title} onClose={onClose}>
      <form
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault()
          void act(save).then((isSaved) => {
            if (isSaved) onClose()
          })
        }}
      >
        {children}
        <ProblemNotice problem={problem} />
        <Button type="submit" size="large" disabled={!isReady} isBusy={busy}>
          {does}
        </Button>
        <Button look="quiet" onClick={onClose}>
          Leave it as it is
        </Button>
      </form>
    </Sheet>
  )
}
