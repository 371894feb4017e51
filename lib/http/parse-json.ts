import { type Refusal, refuse } from '@/lib/platform/refusal'

/** Deeper nesting than any contract of ours; a parser or a schema that recurses would overflow on much more. */
const DEPTH_LIMIT = 32

/** Reads JSON from bytes: strict UTF-8, nesting capped before it is parsed. No bytes are an empty object. */
export function parseJson(bytes: Uint8Array): { readonly value: unknown } | Refusal {
  if (bytes.byteLength === 0) return { value: {} }
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes)
    if (depth(text) > DEPTH_LIMIT) return refuse('malformed')
    return { value: JSON.parse(text) as unknown }
  } catch {
    // Bytes that are no UTF-8, or text that is no JSON: the sender's fault either way.
    return refuse('malformed')
  }
}

function depth(text: string): number {
  let [now, deepest, inString] = [0, 0, false]
  for (let index = 0; index < text.length; index++) {
    const character = text[index]
    if (inString) {
      if (character === '\\') index++
      else if (character === '"') inString = false
      continue
    }
    if (character === '"') inString = true
    else if (character === '[' || character === '{') deepest = Math.max(deepest, ++now)
    else if (character === ']' || character === '}') now--
    if (deepest > DEPTH_LIMIT) return deepest
  }
  return deepest
}
