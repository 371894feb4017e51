import { TOKEN_LENGTH } from './token'

/** What a scanned text is. `shownAs` is a harmless description: foreign text is never opened and never shown as it stands. */
export type QrText = { readonly kind: 'token'; readonly token: string } | { readonly kind: 'foreign'; readonly shownAs: string }

// Not Unicode-aware on purpose: there `ſ` would count as an S, and two texts would be one token.
const TOKEN = new RegExp(`^[A-Z2-7]{${TOKEN_LENGTH}}$`, 'i')
const LINK = new RegExp(`^https?://[a-z0-9.:-]{1,80}/p/([a-z2-7]{${TOKEN_LENGTH}})$`, 'i')
/** Longer than any text of ours; more is not looked at. */
const MOST_READ = 400

/**
 * The text of a sticker's code: all of it in the QR alphanumeric set, so that a phone's own camera opens the public page and the code stays small.
 * `origin` as configured, such as `https://paddock.example`; where it makes no link that can be read again, the bare token, which can.
 */
export function qrText(origin: string, token: string): string {
  const link = `${origin.replace(/\/+$/, '')}/p/${token}`.toUpperCase()
  return LINK.test(link) ? link : token
}

/** Reads a scanned or keyed text. Never throws, whatever it is; a link to any host counts by its token alone, and is never followed. */
export function readQrText(text: string): QrText {
  if (text.length <= MOST_READ) {
    const bare = text.trim()
    const token = TOKEN.test(bare) ? bare : LINK.exec(bare)?.[1]
    if (token !== undefined) return { kind: 'token', token: token.toUpperCase() }
  }
  return { kind: 'foreign', shownAs: describe(text) }
}

/** Says what sort of text it is without a single sign of it: a name in it could be a lie, a sign in it could turn the line around. */
function describe(text: string): string {
  const start = text.slice(0, MOST_READ)
  if (text.length <= MOST_READ && start.trim() === '') return 'an empty code'
  if (/^\s*[a-z][a-z0-9+.-]*:/i.test(start)) return `a link that is not ours (${text.length} characters)`
  return `some other text (${text.length} characters)`
}
