/** Writings an entry list may be in. */
export const LIST_ENCODINGS = ['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'] as const
export type ListEncoding = (typeof LIST_ENCODINGS)[number]

export type Detected =
  | { readonly kind: 'text'; readonly encoding: ListEncoding; /** Bytes of its mark. */ readonly bom: number }
  | { readonly kind: 'not-text'; readonly what: string }

/** First bytes of files that organisers choose by mistake for the list made of them. */
const OTHER_FILES: readonly { readonly bytes: readonly number[]; readonly what: string }[] = [
  { bytes: [0x50, 0x4b, 0x03, 0x04], what: 'a spreadsheet’s own file (xlsx or ods)' },
  { bytes: [0xd0, 0xcf, 0x11, 0xe0], what: 'an old spreadsheet’s own file (xls)' },
  { bytes: [0x25, 0x50, 0x44, 0x46], what: 'a PDF' },
  { bytes: [0xff, 0xfe, 0x00, 0x00], what: 'text in UTF-32' },
]
/** How much is looked at for null bytes; more proves nothing. */
const LOOK_BYTES = 4_096

/**
 * How a list is written: by its mark, by where its null bytes stand (UTF-16 without a mark), or because it is sound UTF-8. What is none of these is read as
 * Windows-1252, in which every byte means something; whoever sees wrong letters chooses by hand.
 */
export function detectEncoding(bytes: Uint8Array): Detected {
  const other = OTHER_FILES.find((file) => file.bytes.every((byte, index) => bytes[index] === byte))
  if (other) return { kind: 'not-text', what: other.what }
  if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) return { kind: 'text', encoding: 'utf-8', bom: 3 }
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return { kind: 'text', encoding: 'utf-16le', bom: 2 }
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return { kind: 'text', encoding: 'utf-16be', bom: 2 }
  const nulls = countNulls(bytes)
  if (nulls.odd > 0 && nulls.even === 0 && nulls.odd * 3 >= nulls.pairs) return { kind: 'text', encoding: 'utf-16le', bom: 0 }
  if (nulls.even > 0 && nulls.odd === 0 && nulls.even * 3 >= nulls.pairs) return { kind: 'text', encoding: 'utf-16be', bom: 0 }
  if (bytes.includes(0)) return { kind: 'not-text', what: 'not a text file' }
  return { kind: 'text', encoding: isUtf8(bytes) ? 'utf-8' : 'windows-1252', bom: 0 }
}

function countNulls(bytes: Uint8Array): { readonly even: number; readonly odd: number; readonly pairs: number } {
  const end = Math.min(bytes.length, LOOK_BYTES)
  let even = 0
  let odd = 0
  for (let index = 0; index < end; index += 1) {
    if (bytes[index] !== 0) continue
    if (index % 2 === 0) even += 1
    else odd += 1
  }
  return { even, odd, pairs: Math.floor(end / 2) }
}

/** Sound UTF-8 (RFC 3629): no stray, missing or overlong bytes. */
export function isUtf8(bytes: Uint8Array): boolean {
  let index = 0
  while (index < bytes.length) {
    const first = bytes[index] ?? 0
    const more =
      first < 0x80 ? 0 : first >= 0xc2 && first < 0xe0 ? 1 : first >= 0xe0 && first < 0xf0 ? 2 : first >= 0xf0 && first < 0xf5 ? 3 : -1
    if (more < 0) return false
    for (let step = 1; step <= more; step += 1) if (((bytes[index + step] ?? 0) & 0xc0) !== 0x80) return false
    const second = bytes[index + 1] ?? 0
    if (
      (first === 0xe0 && second < 0xa0) ||
      (first === 0xed && second > 0x9f) ||
      (first === 0xf0 && second < 0x90) ||
      (first === 0xf4 && second > 0x8f)
    )
      return false
    index += more + 1
  }
  return true
}

/** The text of a list in the writing given, its mark left away. */
export function decodeList(bytes: Uint8Array, encoding: ListEncoding): string {
  const text = encoding === 'windows-1252' ? decodeWindows1252(bytes) : new TextDecoder(encoding).decode(bytes)
  return text.replace(/^\uFEFF/, '')
}

/** What 0x80 to 0x9F mean (WHATWG Encoding, index windows-1252); the five that mean nothing are the control characters of their number. */
const WINDOWS_80_TO_9F = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ'

// By hand: the decoder of Node 20 reads Windows-1252 as Latin-1, and every curly apostrophe and dash becomes a control character.
function decodeWindows1252(bytes: Uint8Array): string {
  const parts: string[] = []
  for (let from = 0; from < bytes.length; from += 8_192) parts.push(String.fromCharCode(...bytes.subarray(from, from + 8_192)))
  return parts.join('').replace(/[\u0080-\u009f]/g, (sign) => WINDOWS_80_TO_9F[sign.charCodeAt(0) - 0x80] ?? sign)
}
