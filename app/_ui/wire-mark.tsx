import { OutcomeMark, type OutcomeState } from './outcome-shape'
import { frayPath, hexagonPoints, ropePath } from './wire-geometry'
import { isBroken, isClosed, type WireBolt } from './wire-links'

const LAY = { y: 0, amplitude: 2.4, pitch: 10 }
const LEFT = 10
const RIGHT = 62

/** Two bolts and what is between them: whole, cut, on its way, or not begun; the right one shows the worst. Beside it how many are closed. */
export function WireMark({ bolts, sentence }: { readonly bolts: readonly WireBolt[]; readonly sentence: string }) {
  const asked = bolts.filter(({ state }) => state !== 'na')
  const closed = asked.filter(({ state }) => isClosed(state)).length
  const worst = worstOf(asked.map(({ state }) => state))
  return (
    <span
      data-slot="wire"
      data-scale="mark"
      role="img"
      aria-label={sentence}
      className="inline-flex items-center gap-1.5 whitespace-nowrap"
    >
      <svg viewBox="-1 -10 74 20" className="h-5 w-[74px] shrink-0" aria-hidden>
        <path
          d={wirePath(worst, asked.length === 0 ? 0 : closed / asked.length)}
          className="fill-none stroke-wire"
          strokeWidth="2"
          strokeLinecap="round"
        />
        <polygon
          points={hexagonPoints(LEFT, 0, 8.6)}
          strokeWidth="1.8"
          className={closed > 0 ? 'fill-wire stroke-wire' : 'fill-ground stroke-muted'}
        />
        <g transform={`translate(${RIGHT} 0)`}>
          <Worst state={worst} />
        </g>
      </svg>
      <span className="heading text-base leading-none tabular-nums" aria-hidden>
        {closed === asked.length ? closed : `${closed}/${asked.length}`}
      </span>
    </span>
  )
}

function Worst({ state }: { readonly state: OutcomeState }) {
  if (state === 'none') return <polygon points={hexagonPoints(0, 0, 8.6)} strokeWidth="1.8" className="fill-ground stroke-muted" />
  return (
    <g transform="scale(.8)">
      <OutcomeMark state={state} />
    </g>
  )
}

/** Whole; cut in its middle with both ends loose; or as far as it has come. */
function wirePath(worst: OutcomeState, share: number): string {
  const [from, to] = [LEFT + 8, RIGHT - 8]
  if (isBroken(worst)) {
    const ends = [from + 8, to - 6] as const
    return (
      ropePath({ ...LAY, fromX: from, toX: ends[0] }) +
      frayPath({ x: ends[0], y: 0, amplitude: 2, direction: 1, length: 7 }) +
      frayPath({ x: ends[1] + 2, y: 0, amplitude: 2, direction: -1, length: 7 })
    )
  }
  if (isClosed(worst)) return ropePath({ ...LAY, fromX: from, toX: to })
  return ropePath({ ...LAY, fromX: from, toX: from + (to - from) * share * 0.8 })
}

const SEVERITY: readonly OutcomeState[] = ['held', 'fail', 'ask', 'none', 'advisory', 'ok', 'na']

function worstOf(states: readonly OutcomeState[]): OutcomeState {
  return SEVERITY.find((state) => states.includes(state)) ?? 'none'
}
