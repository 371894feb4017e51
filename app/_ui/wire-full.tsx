'use client'

import { useState } from 'react'
import { classNames } from './class-names'
import { OutcomeMark } from './outcome-shape'
import { frayPath, hexagonPoints, ropePath } from './wire-geometry'
import { type WireBolt, type WireLink, wireLinks } from './wire-links'

const WIDTH = 88
const HEIGHT = 52
const RADIUS = 23
const EDGE = WIDTH / 2
const LAY = { y: 0, amplitude: 3.4, pitch: 13 }

export interface WireFullProps {
  readonly bolts: readonly WireBolt[]
  /** The wire in words, for who hears it. */
  readonly sentence: string
  /** A bolt is pressed. */
  readonly onSelect?: (index: number) => void
  /** Where one is now. */
  readonly current?: number
}

/** Bolts in rows that fold to the width they have; the wire runs on from the end of a row to the start of the next. */
export function WireFull({ bolts, sentence, onSelect, current }: WireFullProps) {
  const links = wireLinks(bolts)
  return (
    <div data-slot="wire" data-scale="full" role="group" aria-label={sentence}>
      <ol className="grid grid-cols-[repeat(auto-fill,88px)] gap-y-2">
        {bolts.map((bolt, index) => (
          <li key={index} className="flex">
            <Cell
              bolt={bolt}
              before={links[index] ?? 'none'}
              after={links[index + 1] ?? 'none'}
              isCurrent={current === index}
              {...(onSelect ? { onPress: () => onSelect(index) } : {})}
            />
          </li>
        ))}
      </ol>
    </div>
  )
}

interface CellProps {
  readonly bolt: WireBolt
  readonly before: WireLink
  readonly after: WireLink
  readonly isCurrent: boolean
  readonly onPress?: () => void
}

function Cell({ bolt, before, after, isCurrent, onPress }: CellProps) {
  const inside = (
    <>
      <svg viewBox={`${-EDGE} ${-HEIGHT / 2} ${WIDTH} ${HEIGHT}`} className="h-[52px] w-[88px] overflow-visible" aria-hidden>
        <WireEnd link={before} side={-1} />
        <WireEnd link={after} side={1} />
        <BoltHead state={bolt.state} radius={RADIUS} />
        {bolt.state !== 'none' && bolt.state !== 'na' && (
          <g transform="scale(1.12)">
            <OutcomeMark state={bolt.state} />
          </g>
        )}
      </svg>
      <span
        className={classNames(
          'heading block px-0.5 text-center text-base leading-5 wrap-break-word',
          isCurrent && 'underline decoration-4 underline-offset-4',
        )}
      >
        {bolt.label}
        <span className="sr-only">: {WORDS[bolt.state]}</span>
      </span>
    </>
  )
  const shape = 'flex w-[88px] flex-col items-center rounded-sm pb-2'
  if (!onPress) return <div className={shape}>{inside}</div>
  return (
    <button
      type="button"
      onClick={onPress}
      aria-current={isCurrent ? 'step' : undefined}
      className={classNames(shape, 'target active:bg-surface')}
    >
      {inside}
    </button>
  )
}

const WORDS: Readonly<Record<WireBolt['state'], string>> = {
  ok: 'ok',
  advisory: 'advisory',
  fail: 'fail',
  ask: 'still open',
  none: 'not seen yet',
  na: 'does not apply',
  held: 'held',
}

/** Half a link: threads through (once, when it closes under the person's eyes, never on load). From the head's point to the cell's edge, where the neighbour's half begins. */
function WireEnd({ link, side }: { readonly link: WireLink; readonly side: 1 | -1 }) {
  const [atFirst] = useState(link)
  const inner = RADIUS - 8
  if (link === 'whole') {
    const [fromX, toX] = side === 1 ? [inner, EDGE] : [-EDGE, -inner]
    return (
      <path
        d={ropePath({ ...LAY, fromX, toX })}
        className={classNames('fill-none stroke-wire', atFirst !== 'whole' && (side === 1 ? 'wire-threads-out' : 'wire-threads-in'))}
        strokeWidth="2.6"
        strokeLinecap="round"
      />
    )
  }
  const hangsHere = (link === 'cut-after' && side === 1) || (link === 'cut-before' && side === -1)
  if (!hangsHere) return null
  const end = RADIUS + 7
  const [fromX, toX] = side === 1 ? [inner, end] : [-end, -inner]
  const fray = frayPath({ x: side * end, y: 0, amplitude: LAY.amplitude, direction: side, length: EDGE - end + 7 })
  return <path d={ropePath({ ...LAY, fromX, toX }) + fray} className="fill-none stroke-wire" strokeWidth="2.4" strokeLinecap="round" />
}

/** The drilled head of a bolt. Nobody has looked: an outline with its hole; seen: steel. */
export function BoltHead({ state, radius }: { readonly state: WireBolt['state']; readonly radius: number }) {
  if (state === 'none')
    return (
      <>
        <polygon points={hexagonPoints(0, 0, radius)} strokeWidth={1.8} className="fill-ground stroke-muted" />
        <circle r={radius * 0.17} strokeWidth={1.8} className="fill-none stroke-muted" />
      </>
    )
  return (
    <>
      <polygon points={hexagonPoints(0, 0, radius)} strokeWidth={2} className="fill-steel stroke-wire" />
      {state === 'na' && <path d={`M${-radius * 0.26} 0h${radius * 0.52}`} strokeWidth={3} className="stroke-ink" />}
    </>
  )
}
