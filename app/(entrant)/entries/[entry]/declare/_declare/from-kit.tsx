'use client'

import { Button } from '@/app/_ui/button'
import type { Figures } from '@/lib/contracts/declaration'
import { typedOf } from '@/app/(entrant)/_answers/typed-of'
import type { Typed } from '@/lib/walk/read-values'

interface FromKitProps {
  readonly kit: readonly { readonly id: string; readonly name: string; readonly values: Figures }[]
  readonly onTyped: (typed: Typed) => void
}

/** Fills in what is kept of one's own kit, so that a label is read once and not before every event. */
export function FromKit({ kit, onTyped }: FromKitProps) {
  if (kit.length === 0) return null
  return (
    <div className="flex flex-wrap items-center gap-2">
      <span>From my kit:</span>
      {kit.map(({ id, name, values }) => (
        <Button key={id} look="secondary" onClick={() => onTyped(typedOf(values))}>
          {name}
        </Button>
      ))}
    </div>
  )
}
