import { clockTime } from '@/app/_crew/say-when'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { BayOrderView } from '@/lib/contracts/bay-order'

type Window = BayOrderView['windows'][number]

const HOLES: Readonly<Record<BayOrderView['holes'][number]['kind'], string>> = {
  briefing: 'briefing, nobody is called',
  'engine-curfew': 'engines stay off, nobody is called',
  break: 'break, nobody is called',
}

/** The windows in order of time, with the holes between them; a doubtful car has the shape that asks and says why. */
export function WindowList({ order }: { readonly order: BayOrderView }) {
  const { timeZone, windows, holes, lateWindow } = order
  const names = new Map(order.groups.map(({ id, name }) => [id, name]))
  const span = ({ from, to }: { readonly from: number; readonly to: number }) =>
    `${clockTime(from, timeZone)} to ${clockTime(to, timeZone)}`
  const lines = [
    ...windows.map((window) => ({ from: window.from, window, hole: null })),
    ...holes.map((hole) => ({ from: hole.from, window: null, hole })),
  ].toSorted((a, b) => a.from - b.from)
  const known = order.groups.some(({ firstSessionAt }) => firstSessionAt !== null)
  const late = windows.filter(({ isLate }) => isLate).reduce((sum, { cars }) => sum + cars.length, 0)
  return (
    <section aria-labelledby="windows" className="grid gap-3">
      <h2 id="windows" className="text-2xl">
        Call-up windows
      </h2>
      <p role="status" className={late > 0 ? 'font-bold' : ''}>
        {late > 0 ? lateWords(late) : known ? 'Every car is called before its group’s first session.' : NO_TIMETABLE}
      </p>
      <ol>
        {lines.map(({ window, hole }) =>
          window === null ? (
            <li key={`hole ${hole.from}`} className="border-t border-dashed py-2 text-muted">
              {span(hole)} · {HOLES[hole.kind]}
            </li>
          ) : (
            <li key={`${window.from} ${window.group}`} className="grid gap-x-6 gap-y-1 border-t py-3 sm:grid-cols-[220px_minmax(0,1fr)]">
              <p>
                <span className="heading text-xl tabular-nums">{span(window)}</span>
                <br />
                {names.get(window.group)}
                {window.isLate && <span className="font-bold"> · after its first session begins</span>}
              </p>
              <Cars window={window} />
            </li>
          ),
        )}
        {lateWindow && <li className="border-t py-3">{span(lateWindow)} · whoever comes late, whatever the group</li>}
      </ol>
    </section>
  )
}

const NO_TIMETABLE = 'The timetable has no session on this day, so nobody can say whether that is in time.'

function lateWords(late: number): string {
  const cars = late === 1 ? '1 car is' : `${late} cars are`
  return `${cars} called after their group’s first session has begun. Open earlier, or find more people.`
}

function Cars({ window: { cars } }: { readonly window: Window }) {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1">
      {cars.map(({ entry, number, model, doubt }) => (
        <li key={entry} className="flex items-center gap-1.5" title={doubt === null ? model : `${model}: ${doubt}`}>
          {doubt !== null && <OutcomeShape state="ask" className="size-5" />}
          <span className="figures text-xl">{number}</span>
          <span className="sr-only">
            {model}
            {doubt === null ? '' : `, ${doubt}`}
          </span>
        </li>
      ))}
    </ul>
  )
}
