import { WireFull } from './wire-full'
import type { WireBolt } from './wire-links'
import { WireMark } from './wire-mark'
import { WireStrip } from './wire-strip'

export interface WireProps {
  readonly bolts: readonly WireBolt[]
  /** `full`: every bolt with its name, to press; `strip`: a row of a list, open and failed ones shaped; `mark`: whole or cut, and a count. */
  readonly scale: 'full' | 'strip' | 'mark'
  /** The wire in words, for who hears it: “11 of 14 stations ok, brakes failed, 2 to see”. */
  readonly sentence: string
  /** Full scale only: a bolt is pressed. */
  readonly onSelect?: (index: number) => void
  /** Full scale only: where one is now. */
  readonly current?: number
}

/** Progress as one twisted wire through drilled bolts: whole between closed neighbours, cut at a fail, not there yet where nobody has looked. */
export function Wire({ bolts, scale, sentence, ...rest }: WireProps) {
  if (scale === 'strip') return <WireStrip bolts={bolts} sentence={sentence} />
  if (scale === 'mark') return <WireMark bolts={bolts} sentence={sentence} />
  return <WireFull bolts={bolts} sentence={sentence} {...rest} />
}
