import { OutcomeMark } from './outcome-shape'
import { frayPath, hexagonPoints, ropePath } from './wire-geometry'
import { type WireBolt, wireLinks } from './wire-links'

const STEP = 22
const HEIGHT = 20
const LAY = { y: 0, amplitude: 1.9, pitch: 8 }
const SHAPED = 8

/** One row: closed runs are plain wire with a small head where a bolt sits; only what is open, failed or noted has a shape. */
export function WireStrip({ bolts, sentence }: { readonly bolts: readonly WireBolt[]; readonly sentence: string }) {
  const width = bolts.length * STEP
  const links = wireLinks(bolts)
  return (
    <svg
      data-slot="wire"
      data-scale="strip"
      role="img"
      aria-label={sentence}
      viewBox={`0 ${-HEIGHT / 2} ${width} ${HEIGHT}`}
      width={width}
      height={HEIGHT}
      className="h-auto max-w-full"
    >
      <path d={wirePath(links)} className="fill-none stroke-wire" strokeWidth="1.7" strokeLinecap="round" />
      {bolts.map((bolt, index) => (
        <g key={index} transform={`translate(${index * STEP + STEP / 2} 0)`}>
          <StripBolt state={bolt.state} />
        </g>
      ))}
    </svg>
  )
}

function wirePath(links: ReturnType<typeof wireLinks>): string {
  return links
    .map((link, index) => {
      const [left, right] = [(index - 0.5) * STEP, (index + 0.5) * STEP]
      if (link === 'whole') return ropePath({ ...LAY, fromX: left + 3, toX: right - 3 })
      if (link === 'cut-after') return loose(left + 4, 1)
      if (link === 'cut-before') return loose(right - 4, -1)
      return ''
    })
    .join('')
}

function loose(from: number, direction: 1 | -1): string {
  return frayPath({ x: from, y: 0, amplitude: 1.7, direction, length: 7 })
}

function StripBolt({ state }: { readonly state: WireBolt['state'] }) {
  if (state === 'ok') return <polygon points={hexagonPoints(0, 0, 5)} className="fill-wire" />
  if (state === 'na') return <polygon points={hexagonPoints(0, 0, 4.2)} strokeWidth="1.6" className="fill-ground stroke-wire" />
  if (state === 'none')
    return (
      <>
        <polygon points={hexagonPoints(0, 0, SHAPED)} strokeWidth="1.6" className="fill-ground stroke-muted" />
        <circle r="1.7" className="fill-muted" />
      </>
    )
  return (
    <g transform="scale(.78)">
      <OutcomeMark state={state} />
    </g>
  )
}
