import Link from 'next/link'
import { hexagonPoints, ropePath } from './wire-geometry'

/** Two bolts, one wire, and the name; leads home. */
export function Brand() {
  return (
    <Link href="/" data-slot="brand" className="target inline-flex items-center gap-2 text-ink">
      <svg viewBox="-2 -14 76 28" className="h-7 w-[76px]" aria-hidden>
        <path
          d={ropePath({ fromX: 19, toX: 44, y: 0, amplitude: 3.4, pitch: 12 })}
          strokeWidth="2.6"
          strokeLinecap="round"
          className="fill-none stroke-wire"
        />
        <polygon points={hexagonPoints(13, 0, 13)} className="fill-wire" />
        <circle cx="13" r="4" className="fill-ground" />
        <polygon points={hexagonPoints(59, 0, 12)} strokeWidth="2.4" className="fill-ground stroke-wire" />
        <circle cx="59" r="4" className="fill-wire" />
      </svg>
      <span className="heading text-xl">Lockwire</span>
    </Link>
  )
}
