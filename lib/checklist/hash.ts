import { sha256 } from '@noble/hashes/sha2.js'
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js'
import canonicalize from 'canonicalize'

/** SHA-256 in lower-case hex; text is hashed as UTF-8. */
export function sha256Hex(input: string | Uint8Array): string {
  return bytesToHex(sha256(typeof input === 'string' ? utf8ToBytes(input) : input))
}

/** SHA-256 over the canonical JSON of a value (RFC 8785): the order of keys and the white space of a file make no difference. Throws on what is no JSON. */
export function hashJson(value: unknown): string {
  const text = canonicalize(value)
  if (text === undefined) throw new Error('only a JSON value can be hashed')
  return sha256Hex(text)
}

/** Hash of the limits a rule judged under, as a finding pins them. The rule's name is part of it: equal numbers of two rules are not equal limits. */
export function paramsHash(ruleName: string, params: Readonly<Record<string, unknown>>): string {
  return hashJson({ rule: ruleName, params })
}
