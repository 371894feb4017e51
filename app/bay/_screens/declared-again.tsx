'use client'

import { useDay } from '@/app/_crew/day-context'
import { clockTime } from '@/app/_crew/say-when'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { useSubjectState } from '@/lib/sync/client/use-day'

/** Says that the entrant has declared anew since the car was presented: the walk still goes by the declaration that was pinned. */
export function DeclaredAgain({ entry }: { readonly entry: DayEntry }) {
  const day = useDay()
  const pinned = useSubjectState(day, `car:${entry.id}`).presentedHeads.at(-1)?.record
  const { declaration, declaredAt } = entry
  if (!pinned || !declaration || declaration.version === pinned.declaration?.version) return null
  const zone = day.snapshot()?.event.timeZone
  const when = declaredAt === null || zone === undefined ? '' : ` at ${clockTime(declaredAt, zone)}`
  return (
    <p role="status" className="border-l-4 border-accent px-4 py-2 font-bold">
      {pinned.declaration === null ? 'Declared' : 'Declared again'}
      {when}, after it was presented. Say anew what stands before you, and ask the driver what changed.
    </p>
  )
}
