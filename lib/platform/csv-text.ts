/**
 * Rows as CSV text (RFC 4180, with a mark for UTF-8 so that spreadsheets read its letters). A cell that begins with a sign a spreadsheet takes for a formula
 * gets a quote before it: what somebody wrote into an entry list must not run on the organiser's machine.
 */
export function csvText(rows: readonly (readonly (string | number)[])[]): string {
  return `\uFEFF${rows.map((cells) => cells.map(cellText).join(',')).join('\r\n')}\r\n`
}

function cellText(cell: string | number): string {
  // A number of ours is no formula, be it negative.
  const text = typeof cell === 'number' ? String(cell) : /^[\s]*[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell
  return /[",\r\n;\t]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text
}
