import { WireFull, type WireFullProps } from './wire-full'
import { WireMark } from './wire-mark'
import { WireStrip } from './wire-strip'

/** `onSelect` and `current` are for the full scale. The sentence is like “11 of 14 stations ok, brakes failed, 2 to see”. */
export interface WireProps extends WireFullProps {
  /** `full`: every bolt with its name, to press; `strip`: a row of a list, open and failed ones shaped; `mark`: whole or cut, and a count. */
  readonly scale: 'full' | 'strip' | 'mark'
}

/** Progress as one twisted wire through drilled bolts: whole between closed neighbours, cut at a fail, not there yet where nobody has looked. */
export function Wire({ bolts, scale, sentence, ...rest }: WireProps) {
  if (scale === 'strip') return <WireStrip bolts={bolts} sentence={sentence} />
  if (scale === 'mark') return <WireMark bolts={bolts} sentence={sentence} />
  return <WireFull bolts={bolts} sentence={sentence} {...rest} />
}
