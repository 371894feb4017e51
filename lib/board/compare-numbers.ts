/** Order of entry numbers as people look for them: 7 before 47 before 103, `007` beside 7, letters after. Locale-free, so that server and browser agree. */
export function compareNumbers(a: string, b: string): number {
  const [left, right] = [numericPart(a), numericPart(b)]
  if (left !== right) return left - right
  return a < b ? -1 : a > b ? 1 : 0
}

function numericPart(number: string): number {
  const digits = /^\d+/.exec(number)?.[0]
  return digits === undefined ? Number.MAX_SAFE_INTEGER : Number(digits)
}
