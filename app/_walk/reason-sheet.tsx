'use client'

import { useState } from 'react'
import type { BookCheck } from '@/lib/checklist/book'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Sheet } from '@/app/_ui/sheet'

interface ReasonSheetProps {
  readonly check: BookCheck
  readonly title: string
  /** Free text; empty for none. Held by the caller: a press beside the sheet must not lose it. */
  readonly note: string
  readonly onNote: (note: string) => void
  readonly onReason: (id: string) => void
  readonly onClose: () => void
}

/** Asks for the reason: one tap for those of the list; *anything else I do not like* wants words. */
export function ReasonSheet({ check, title, note, onNote, onReason, onClose }: ReasonSheetProps) {
  const [asked, setAsked] = useState(false)
  const isMissing = asked && note.trim() === ''
  const pick = (id: string) => {
    if (id === 'other' && note.trim() === '') setAsked(true)
    else onReason(id)
  }
  return (
    <Sheet isOpen title={title} onClose={onClose}>
      <TextField
        label="In your own words"
        isOptional={!asked}
        value={note}
        maxLength={500}
        error={isMissing ? 'Write what you do not like, then tap it again.' : undefined}
        onChange={(event) => onNote(event.target.value)}
      />
      <div className="mt-4 grid gap-3">
        {check.reasons.map((reason) => (
          <Button key={reason.id} look="secondary" size="large" onClick={() => pick(reason.id)}>
            {reason.text}
          </Button>
        ))}
        <Button look="quiet" onClick={onClose}>
          Back to the check
        </Button>
      </div>
    </Sheet>
  )
}
