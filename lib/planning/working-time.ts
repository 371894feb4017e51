/** A stretch of time, instants in ms since the epoch; its end is no longer in it. */
export interface Span {
  readonly from: number
  readonly to: number
}

/** What is left of a span when the holes are taken out: in order, none empty. Holes may overlap and stick out. */
export function workingSpans(span: Span, holes: readonly Span[]): readonly Span[] {
  let left: readonly Span[] = span.to > span.from ? [span] : []
  for (const hole of holes) {
    if (hole.to <= hole.from) continue
    left = left.flatMap((each) =>
      hole.to <= each.from || hole.from >= each.to
        ? [each]
        : [
            { from: each.from, to: Math.max(each.from, hole.from) },
            { from: Math.min(each.to, hole.to), to: each.to },
          ].filter(({ from, to }) => to > from),
    )
  }
  return left
}

/** Working minutes between two instants. */
export function workingMinutes(span: Span, holes: readonly Span[]): number {
  return workingSpans(span, holes).reduce((sum, { from, to }) => sum + (to - from), 0) / 60_000
}

/** The instant at which so many working minutes after `from` are done; holes are skipped. */
export function afterWorking(from: number, minutes: number, holes: readonly Span[]): number {
  let left = minutes * 60_000
  let at = from
  for (const hole of [...holes].sort((a, b) => a.from - b.from)) {
    if (hole.to <= at || hole.to <= hole.from) continue
    if (at + left <= hole.from) return at + left
    left -= Math.max(0, hole.from - at)
    at = hole.to
  }
  return at + left
}

/** The first instant from `at` on that lies in no hole. */
export function nextWorking(at: number, holes: readonly Span[]): number {
  const hole = holes.find(({ from, to }) => from <= at && at < to)
  return hole === undefined ? at : nextWorking(hole.to, holes)
}
