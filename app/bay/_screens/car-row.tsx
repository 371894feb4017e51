import { useDay } from '@/app/_crew/day-context'
import { goTo } from '@/app/_crew/use-location'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { Wire } from '@/app/_ui/wire'
import { wireSentence, wireStations } from '@/lib/inspection/wire'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { VERDICT_SHAPES } from '@/app/_walk/verdict-words'

/** One car found: number, plate, what it looks like, and how it stands. */
export function CarRow({ entry }: { readonly entry: DayEntry }) {
  const day = useDay()
  const state = day.state(`car:${entry.id}`)
  const head = state.presentedHeads[0]?.record
  const book = head ? day.book(head.checklist, head.limits) : day.book()
  const stations = book ? wireStations(state, book) : []
  return (
    <li className="border-t border-line">
      <button
        type="button"
        onClick={() => goTo(`/bay/car/${entry.id}`)}
        className="target-outcome grid w-full grid-cols-[auto_1fr] items-center gap-x-4 py-2 text-left"
      >
        <span className="figures text-6xl">{entry.number}</span>
        <span className="grid gap-1">
          <span className="font-bold">
            {entry.plate} · {entry.model}
          </span>
          <span className="text-muted">
            {entry.colour} · {entry.groupName}
          </span>
          <span className="flex items-center gap-2">
            <OutcomeShape state={VERDICT_SHAPES[state.verdict]} className="size-5" />
            {state.verdict}
          </span>
          <Wire
            scale="strip"
            bolts={stations.map(({ short, state: bolt }) => ({ label: short, state: bolt }))}
            sentence={wireSentence(stations)}
          />
        </span>
      </button>
    </li>
  )
}
