import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import { readEntryCode } from '@/lib/pass/entry-code'
import type { PassList } from '@/lib/pass/pass-list'
import { readQrText } from '@/lib/pass/qr-text'
import { typedCode } from '@/lib/pass/typed-code'
import { entryOfCode } from './search-cars'

/** The entry that a scanned text names: the code on the driver's phone, or the sticker of a pass on the list. Null for another event's and for anything else. */
export function entryOfScan(
  text: string,
  snapshot: { readonly event: Pick<DaySnapshot['event'], 'code'>; readonly entries: readonly Pick<DaySnapshot['entries'][number], 'id' | 'code'>[] } | null, // prettier-ignore
  list: PassList | null,
): string | null {
  const code = readEntryCode(text)
  if (code !== null)
    return snapshot?.event.code === code.event ? (snapshot.entries.find((entry) => entry.code === code.entry)?.id ?? null) : null
  const read = readQrText(text)
  return read.kind === 'token' ? entryOfCode(list, typedCode(read.token)) : null
}
