const FORM = /^ENTRY:(\d{1,5}):(\d{1,5})$/

/** What names an entry to the bay's camera: the event's and the entry's numbers, as they stand in tokens. It is no pass and opens nothing. */
export function entryCodeText(code: { readonly event: number; readonly entry: number }): string {
  return `ENTRY:${String(code.event)}:${String(code.entry)}`
}

/** Event and entry of such a text; null for any other. */
export function readEntryCode(text: string): { readonly event: number; readonly entry: number } | null {
  const match = FORM.exec(text.trim().toUpperCase())
  return match === null ? null : { event: Number(match[1]), entry: Number(match[2]) }
}
