import { foldToBase40 } from './base40'

/** Letters and digits of a plate that a pass carries. */
export const PLATE_TAIL_LENGTH = 5

/** The end of a plate as the pass carries it: `GF90 VGN` → `90VGN`. */
export function plateTail(plate: string): string {
  return foldToBase40Long(plate).slice(-PLATE_TAIL_LENGTH)
}

/** A number as the pass carries it. */
export function passNumber(number: string): string {
  return foldToBase40(number)
}

// foldToBase40 cuts at the front six characters; a tail wants the last ones.
function foldToBase40Long(plate: string): string {
  return [...plate.replace(/[\s./-]/g, '')].map((letter) => foldToBase40(letter)).join('')
}
