import { foldToBase40 } from './base40'

/** Letters and digits of a plate that a pass carries. */
export const PLATE_TAIL_LENGTH = 5

/** The end of a plate as the pass carries it: `GF90 VGN` → `90VGN`. */
export function plateTail(plate: string): string {
  return foldAll(plate).slice(-PLATE_TAIL_LENGTH)
}

/** A tail as it is shown: `…90VGN`; empty where there is none. */
export function showTail(tail: string): string {
  return tail === '' ? '' : `…${tail}`
}

/** A number as the pass carries it. */
export function passNumber(number: string): string {
  return foldToBase40(number)
}

// `foldToBase40` keeps the first six characters; a tail is the last ones.
function foldAll(plate: string): string {
  return Array.from(plate.replace(/[\s./-]/g, ''), foldToBase40).join('')
}
