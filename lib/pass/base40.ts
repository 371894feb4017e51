/**
 * The token's alphabet: index 0 is the pad, a symbol of its own, so that `007` is not `7`; then A–Z, 0–9 and three signs.
 * Six characters make one u32, the first character the most significant.
 */
const ALPHABET = '\u0000ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789-./'
export const BASE40_LENGTH = 6
const LIMIT = 40 ** BASE40_LENGTH

// Letters that do not fall apart into base letter and mark.
const FOLDED: Readonly<Record<string, string>> = { ß: 'SS', Ø: 'O', Æ: 'AE', Œ: 'OE', Đ: 'D', Ł: 'L', Þ: 'TH', Ð: 'D', İ: 'I' }

/** Upper case, each letter its base letter (Ö → O), anything else outside the alphabet dropped, cut to six. */
export function foldToBase40(text: string): string {
  const upper = Array.from(text.toUpperCase(), (letter) => FOLDED[letter] ?? letter).join('')
  const base = upper.normalize('NFD').replace(/[^A-Z0-9./-]/g, '')
  return base.slice(0, BASE40_LENGTH)
}

/** Packs up to six characters of the alphabet; throws on others, which `foldToBase40` has removed. */
export function packBase40(text: string): number {
  if (text.length > BASE40_LENGTH) throw new Error(`more than ${BASE40_LENGTH} characters: ${text}`)
  let packed = 0
  for (let at = 0; at < BASE40_LENGTH; at += 1) {
    const character = text[at] ?? '\u0000'
    const value = ALPHABET.indexOf(character)
    if (value < 0 || (at < text.length && value === 0)) throw new Error(`not in the token's alphabet: ${JSON.stringify(text)}`)
    packed = packed * 40 + value
  }
  return packed
}

/** Reads a packed value; null where it is none: 40⁶ or more, or a pad before a character. */
export function unpackBase40(packed: number): string | null {
  if (!Number.isInteger(packed) || packed < 0 || packed >= LIMIT) return null
  let text = ''
  let rest = packed
  for (let at = 0; at < BASE40_LENGTH; at += 1) {
    text = (ALPHABET[rest % 40] ?? '') + text
    rest = Math.floor(rest / 40)
  }
  const trimmed = text.replace(/\u0000+$/, '')
  return trimmed.includes('\u0000') ? null : trimmed
}
