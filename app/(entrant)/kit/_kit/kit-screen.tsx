'use client'

import { useState } from 'react'
import { dayWords } from '@/app/_crew/say-when'
import { Button } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import type { BookCheck } from '@/lib/checklist/book'
import type { KitKind } from '@/lib/contracts/my-garage'
import type { MyKit } from '@/lib/entrants/queries/my-garage'
import { KitForm } from './kit-form'
import { KIT_WORDS, KitLine } from './kit-line'

interface KitScreenProps {
  readonly kit: readonly MyKit[]
  readonly checks: readonly BookCheck[]
  readonly judgedFor: { readonly event: string; readonly lastDay: string } | null
}

const KINDS: readonly KitKind[] = ['helmet', 'head-restraint', 'suit', 'gloves', 'other']

/** One's kit with its labels, read once and used in every declaration. */
export function KitScreen({ kit, checks, judgedFor }: KitScreenProps) {
  const [open, setOpen] = useState<{ readonly id: string } | { readonly kind: KitKind } | null>(null)
  const forms = { checks, lastDay: judgedFor?.lastDay ?? null, onClose: () => setOpen(null) }
  return (
    <div className="grid gap-6">
      {judgedFor && (
        <p className="max-w-prose">
          Labels are judged here as for {judgedFor.event}, {dayWords(judgedFor.lastDay)}. Nothing is passed here: sign-on looks at the kit
          on the day.
        </p>
      )}
      {kit.length === 0 && (
        <EmptyState title="No kit yet">Add your helmet and what else carries a label. A declaration then takes it from here.</EmptyState>
      )}
      <ul className="grid gap-4">
        {kit.map((piece) => (
          <li key={piece.id} className="border-2 p-3">
            {open !== null && 'id' in open && open.id === piece.id ? (
              <KitForm piece={piece} kind={piece.kind} {...forms} />
            ) : (
              <KitLine piece={piece} checks={checks} lastDay={forms.lastDay} onOpen={() => setOpen({ id: piece.id })} />
            )}
          </li>
        ))}
      </ul>
      {open !== null && 'kind' in open ? (
        <div className="border-2 p-3">
          <KitForm piece={null} kind={open.kind} {...forms} />
        </div>
      ) : (
        <section aria-labelledby="add">
          <h2 id="add" className="text-xl">
            Add
          </h2>
          <div className="mt-2 flex flex-wrap gap-2">
            {KINDS.map((kind) => (
              <Button key={kind} look="secondary" onClick={() => setOpen({ kind })}>
                {KIT_WORDS[kind]}
              </Button>
            ))}
          </div>
        </section>
      )}
    </div>
  )
}
