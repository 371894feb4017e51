/** Most a phone sends of one photograph, bytes: it must get through where a page hardly does (rule S9). */
export const SENT_LIMIT_BYTES = 300_000

export interface PhotoTry {
  readonly width: number
  readonly height: number
  /** 0 to 1, as a canvas takes it. */
  readonly quality: number
}

/** From what reads best to what surely fits: a figure on a label is lost by shrinking sooner than by coarser encoding. */
const STEPS = [
  { longest: 1600, qualities: [0.82, 0.7, 0.58] },
  { longest: 1280, qualities: [0.7, 0.55] },
  { longest: 1024, qualities: [0.6, 0.45] },
  { longest: 640, qualities: [0.5, 0.3] },
] as const

/** In which sizes and qualities a picture of this size is tried, best first; never made larger than it is. */
export function photoTries(width: number, height: number): readonly PhotoTry[] {
  return STEPS.flatMap(({ longest, qualities }) => {
    const scale = Math.min(1, longest / Math.max(width, height))
    const size = { width: Math.max(1, Math.round(width * scale)), height: Math.max(1, Math.round(height * scale)) }
    return qualities.map((quality) => ({ ...size, quality }))
  })
}
