/** What a row of a list stands for. `spare` is a fleet's spare car: an entry of its own that others may drive. */
export type RowRole = 'driver' | 'instructor' | 'passenger' | 'spare'

/** One row of an entry list, read and clean. `row` counts from 1 at the first line, as a spreadsheet shows it. */
export interface EntryRow {
  readonly row: number
  readonly role: RowRole
  readonly number: string
  /** For an instructor or passenger: the cars named, where the cell names several. */
  readonly numbers: readonly string[]
  readonly name: string
  readonly email: string
  readonly mobile: string
  readonly model: string
  readonly colour: string
  /** Upper case, single spaces. */
  readonly plate: string
  readonly group: string
  readonly passengerSeats: number
  readonly secondDriver: string
  readonly team: string
  readonly note: string
}

/** What is wrong with one cell (or, where `column` is empty, with the row or the file), and what to do about it. */
export interface RowProblem {
  readonly row: number
  readonly column: string
  readonly value: string
  readonly why: string
}

/** Something that was done with a row and that nobody need answer. */
export interface RowRemark {
  readonly row: number
  readonly words: string
}

/** A plate without its spaces: two writings of one plate are one plate. */
export function plateKey(plate: string): string {
  return plate.toUpperCase().replace(/[^\p{L}\p{N}]/gu, '')
}

/** A name or word as it is compared: case, accents' writing and spaces do not matter. */
export function foldWord(word: string): string {
  return word.normalize('NFKC').trim().toLowerCase().replace(/\s+/g, ' ')
}
