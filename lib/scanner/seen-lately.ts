/** Tells whether a text is new: it was not seen within the last `quietMs`. Each sight renews it, so a code held in view is new once. */
export function seenLately(quietMs: number): (text: string, nowMs: number) => boolean {
  let last: { readonly text: string; readonly atMs: number } | null = null
  return (text, nowMs) => {
    const isNew = last?.text !== text || nowMs - last.atMs > quietMs
    last = { text, atMs: nowMs }
    return isNew
  }
}
