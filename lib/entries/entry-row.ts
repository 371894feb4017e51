/** One row of an entry list, read and clean. `row` counts from 1 at the header, as a spreadsheet shows it. */
export interface EntryRow {
  readonly row: number
  readonly number: string
  readonly firstName: string
  readonly surname: string
  readonly email: string
  readonly mobile: string
  readonly model: string
  readonly colour: string
  /** Upper case, single spaces. */
  readonly plate: string
  readonly group: string
  readonly passengerSeats: number
  readonly note: string
}

/** What is wrong with one cell (or, where `column` is empty, with the row or the file), and what to do about it. */
export interface RowProblem {
  readonly row: number
  readonly column: string
  readonly value: string
  readonly why: string
}

/** A plate without its spaces: two writings of one plate are one plate. */
export function plateKey(plate: string): string {
  return plate.toUpperCase().replace(/[^\p{L}\p{N}]/gu, '')
}

/** First name and surname as one name, as screens show it. */
export function fullName(row: Pick<EntryRow, 'firstName' | 'surname'>): string {
  return `${row.firstName} ${row.surname}`.trim()
}
