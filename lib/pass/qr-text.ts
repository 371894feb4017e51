import { TOKEN_LENGTH } from './token'

/** What a scanned text is. `shownAs` is a harmless description: foreign text is never opened and never shown as it stands. */
export type QrText = { readonly kind: 'token'; readonly token: string } | { readonly kind: 'foreign'; readonly shownAs: string }

const TOKEN = new RegExp(`^[A-Z2-7]{${TOKEN_LENGTH}}$`)
const LINK = new RegExp(`^HTTPS?://[A-Z0-9.:-]{1,80}/P/([A-Z2-7]{${TOKEN_LENGTH}})$`)

/**
 * The text of a sticker's code: all of it in the QR alphanumeric set, so that a phone's own camera opens the public page and the code stays small.
 * `origin` as configured, such as `https://paddock.example`.
 */
export function qrText(origin: string, token: string): string {
  return `${origin}/p/${token}`.toUpperCase()
}

/** Reads a scanned or keyed text. Never throws, whatever it is; a link to any host counts by its token alone, and is never followed. */
export function readQrText(text: string): QrText {
  if (text.length <= 400) {
    const upper = text.trim().toUpperCase()
    if (TOKEN.test(upper)) return { kind: 'token', token: upper }
    const link = LINK.exec(upper)?.[1]
    if (link !== undefined) return { kind: 'token', token: link }
  }
  return { kind: 'foreign', shownAs: describe(text) }
}

function describe(text: string): string {
  if (text.trim() === '') return 'an empty code'
  if (/^\s*[a-z][a-z0-9+.-]*:/i.test(text)) return `a link of somebody else’s (${text.length} characters)`
  return `some other text (${text.length} characters)`
}
