'use client'

import { useState } from 'react'
import type { BookCheck } from '@/lib/checklist/book'
import { Button } from '@/app/_ui/button'
import { Sheet } from '@/app/_ui/sheet'

export interface ReasonGiven {
  readonly id: string
  /** Free text; empty for none. */
  readonly note: string
}

interface ReasonSheetProps {
  readonly check: BookCheck
  readonly title: string
  readonly onReason: (reason: ReasonGiven) => void
  readonly onClose: () => void
}

/** Asks for the reason: one tap for those of the list; *anything else I do not like* wants words. */
export function ReasonSheet({ check, title, onReason, onClose }: ReasonSheetProps) {
  const [note, setNote] = useState('')
  const [asked, setAsked] = useState(false)
  const pick = (id: string) => {
    if (id === 'other' && note.trim() === '') setAsked(true)
    else onReason({ id, note: note.trim() })
  }
  return (
    <Sheet isOpen title={title} onClose={onClose}>
      <label className="grid gap-1">
        <span>In your own words{asked ? ' (needed for this one)' : ' (if you like)'}</span>
        <input
          className="target rounded-sm border border-line bg-ground px-3"
          value={note}
          maxLength={500}
          aria-invalid={asked && note.trim() === ''}
          onChange={(event) => setNote(event.target.value)}
        />
      </label>
      {asked && note.trim() === '' && (
        <p role="alert" className="mt-2 font-bold">
          Write what you do not like, then tap it again.
        </p>
      )}
      <div className="mt-4 grid gap-3">
        {check.reasons.map((reason) => (
          <Button key={reason.id} look="secondary" size="large" onClick={() => pick(reason.id)}>
            {reason.text}
          </Button>
        ))}
      </div>
    </Sheet>
  )
}
