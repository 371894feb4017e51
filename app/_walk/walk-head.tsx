import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { Wire } from '@/app/_ui/wire'
import type { Book } from '@/lib/checklist/book'
import { wireSentence, wireStations } from '@/lib/inspection/wire'
import type { WalkPlace } from '@/lib/walk/walk-plan'
import type { WalkStop } from '@/lib/walk/next-stop'
import { openStop } from './open-stop'
import type { Walk } from './use-walk'
import { VERDICT_SHAPES } from './verdict-words'

/** The wire of a walk, each bolt a way to its station, and the verdict in shape and word. */
export function WalkHead({ walk, book, base }: { readonly walk: Walk; readonly book: Book; readonly base: string }) {
  const { state, plan, subject } = walk
  const stations = wireStations(state, book)
  const jump = (index: number) => {
    const stop = firstOfStation(plan, stations[index]?.station)
    if (stop) openStop(subject, base, stop)
  }
  return (
    <>
      <Wire
        scale="full"
        bolts={stations.map(({ short, state: bolt }) => ({ label: short, state: bolt }))}
        sentence={wireSentence(stations)}
        {...(plan.length > 0 ? { onSelect: jump } : {})}
      />
      <p role="status" className="flex items-center gap-3 text-xl font-bold">
        <OutcomeShape state={VERDICT_SHAPES[state.verdict]} className="size-9" />
        {state.verdict}
      </p>
    </>
  )
}

/** What is open of a station first, else its first check; null where the walk asks nothing of it. */
function firstOfStation(plan: readonly WalkPlace[], station: string | undefined): WalkStop | null {
  const items = plan.flatMap((place) => [...place.oneByOne, ...place.together]).filter(({ check }) => check.station === station)
  const first = items.find((item) => !item.answered) ?? items[0]
  return first ? { place: first.check.place, check: first.check.id } : null
}
