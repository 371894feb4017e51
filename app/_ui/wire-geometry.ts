// Geometry of bolts and wire, in SVG user units, around points given by the caller. Numbers only; colours and meaning are the components'.

const POINT_ANGLES = [0, 60, 120, 180, 240, 300].map((degrees) => (degrees * Math.PI) / 180)

/** A regular hexagon with points left and right, as `points` of a polygon. `radius` is centre to point. */
export function hexagonPoints(x: number, y: number, radius: number): string {
  return POINT_ANGLES.map((angle) => `${round(x + radius * Math.cos(angle))},${round(y + radius * Math.sin(angle))}`).join(' ')
}

export interface Rope {
  readonly fromX: number
  readonly toX: number
  readonly y: number
  /** Half the rope's height. */
  readonly amplitude: number
  /** Length of one lay of a strand; strands follow each other at half of it. */
  readonly pitch: number
}

/**
 * The front of two strands twisted together: a row of equal slanted S-curves, as `d` of a path. The lay is stretched a little so that a
 * whole number of curves fills the length: two ropes that meet show no seam.
 */
export function ropePath({ fromX, toX, y, amplitude, pitch }: Rope): string {
  const length = toX - fromX
  if (length <= 0) return ''
  const step = pitch / 2
  const count = Math.max(1, Math.round(length / step))
  const width = length / count
  return Array.from({ length: count }, (_, index) => {
    const x = fromX + index * width
    // Each front runs on under the next but one: that is what makes a twist of it and not a spring.
    const reach = width * 1.7
    return `M${round(x)} ${round(y - amplitude)}c${round(reach * 0.555)} 0 ${round(reach * 0.55)} ${round(amplitude * 2)} ${round(reach)} ${round(amplitude * 2)}`
  }).join('')
}

export interface Fray {
  readonly x: number
  readonly y: number
  readonly amplitude: number
  /** 1: the cut end points right; -1: left. */
  readonly direction: 1 | -1
  readonly length: number
}

/** A cut end: the two strands spring apart and hang, one less than the other. */
export function frayPath({ x, y, amplitude, direction, length }: Fray): string {
  const along = (share: number) => round(direction * length * share)
  return [
    `M${round(x)} ${round(y - amplitude * 0.6)}c${along(0.4)} ${round(-amplitude * 0.4)} ${along(0.8)} ${round(-amplitude * 1.2)} ${along(0.9)} ${round(-amplitude * 2.6)}`,
    `M${round(x)} ${round(y + amplitude * 0.6)}c${along(0.5)} ${round(amplitude * 0.2)} ${along(0.9)} ${round(amplitude * 1.8)} ${along(0.8)} ${round(amplitude * 4)}`,
  ].join('')
}

/** Bars at 45 degrees across a ring, `gap` apart, as `d` of a path: the hatch that says *held*. */
export function ringHatchPath(inner: number, outer: number, gap: number): string {
  const diagonal = Math.SQRT1_2
  const bars: string[] = []
  for (let offset = -outer + gap / 2; offset < outer; offset += gap) {
    const far = Math.sqrt(Math.max(0, outer ** 2 - offset ** 2))
    const near = Math.abs(offset) < inner ? Math.sqrt(inner ** 2 - offset ** 2) : 0
    // Along (1,-1)/√2, shifted by `offset` along (1,1)/√2.
    const at = (distance: number) => `${round((offset + distance) * diagonal)} ${round((offset - distance) * diagonal)}`
    if (near === 0) bars.push(`M${at(-far)}L${at(far)}`)
    else bars.push(`M${at(-far)}L${at(-near)}M${at(near)}L${at(far)}`)
  }
  return bars.join('')
}

function round(value: number): number {
  return Math.round(value * 100) / 100
}
