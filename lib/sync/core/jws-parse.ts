import { fromBase64url } from './base64url'

/** A compact JWS taken apart; nothing is verified here. */
export interface ParsedJws {
  readonly header: Readonly<Record<string, unknown>>
  readonly payload: Readonly<Record<string, unknown>>
  /** What the signature is over (RFC 7515, 5.1): the text before the second full stop. */
  readonly signingInput: string
  readonly signature: Uint8Array<ArrayBuffer>
}

/** Deepest nesting of a payload that is read; a record needs four. */
const MAX_DEPTH = 12
const decoder = new TextDecoder('utf-8', { fatal: true })

/** Takes a compact JWS apart; null when it is none, its JSON is broken or too deep, or it asks for extensions (`crit`). */
export function parseJws(jws: string): ParsedJws | null {
  const [head, body, sign, ...rest] = jws.split('.')
  if (head === undefined || body === undefined || sign === undefined || rest.length > 0) return null
  const header = jsonObject(head)
  const payload = jsonObject(body)
  const signature = fromBase64url(sign)
  if (header === null || payload === null || signature === null || 'crit' in header) return null
  return { header, payload, signingInput: jws.slice(0, head.length + 1 + body.length), signature }
}

function jsonObject(part: string): Readonly<Record<string, unknown>> | null {
  const bytes = fromBase64url(part)
  if (bytes === null) return null
  try {
    const text = decoder.decode(bytes)
    if (isTooDeep(text)) return null
    const value: unknown = JSON.parse(text)
    return typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Record<string, unknown>) : null
  } catch {
    // Not UTF-8 or not JSON: what came is no JWS of ours, which is all a caller may know.
    return null
  }
}

// Counted on the text, before JSON.parse: a 200,000-deep array parses, and overflows whatever walks it later.
function isTooDeep(text: string): boolean {
  let depth = 0
  let inString = false
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index)
    if (inString) {
      if (code === 0x5c) index += 1
      else if (code === 0x22) inString = false
    } else if (code === 0x22) inString = true
    else if (code === 0x7b || code === 0x5b) {
      depth += 1
      if (depth > MAX_DEPTH) return true
    } else if (code === 0x7d || code === 0x5d) depth -= 1
  }
  return false
}
