import { judgedKind } from '@/lib/inspection/subject'
import type { Walk } from './use-walk'

/** Checks named in the line at most. */
const MOST_NAMED = 6

const NOT_YET = { car: 'No pass yet.', person: 'No band yet.', fit: 'May not drive this car yet.' } as const

/** Why there is no pass or band yet: what required has not been seen, or stands against it. Nothing here can be pressed past. */
export function NotYet({ walk }: { readonly walk: Walk }) {
  const { state, plan, subject } = walk
  const shorts = new Map(plan.flatMap(({ oneByOne, together }) => [...oneByOne, ...together].map(({ check }) => [check.id, check.short])))
  const open = state.open.flatMap((id) => shorts.get(id) ?? [])
  if (open.length === 0) return null
  const more = open.length - MOST_NAMED
  return (
    <p data-slot="not-yet" className="border-l-4 border-line pl-3">
      <span className="font-bold">{NOT_YET[judgedKind(subject)]}</span> Still to be in order: {open.slice(0, MOST_NAMED).join(', ')}
      {more > 0 ? ` and ${more} more` : ''}.
    </p>
  )
}
