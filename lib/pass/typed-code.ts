import { sha256 } from '@noble/hashes/sha2.js'

/** 32 signs without I, L, O and U, which are misread. */
const ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'
const DATA_LENGTH = 7
export const TYPED_CODE_LENGTH = DATA_LENGTH + 1
const MOST_TYPED = 100

/**
 * The code to type where no camera helps: eight signs from the SHA-256 of the token, the last a check sign. It proves nothing; it only
 * finds a pass that is on the list already (rule P7). Written without its hyphen.
 */
export function typedCode(token: string): string {
  const digest = sha256(new TextEncoder().encode(token))
  let bits = 0n
  for (const byte of digest.subarray(0, 5)) bits = (bits << 8n) | BigInt(byte)
  const values = Array.from({ length: DATA_LENGTH }, (_, at) => Number((bits >> BigInt(35 - 5 * at)) & 31n))
  return [...values, checkSign(values)].map((value) => ALPHABET[value]).join('')
}

/** As it is printed and read out: `K7QM-2R9T`. */
export function showTypedCode(code: string): string {
  return `${code.slice(0, 4)}-${code.slice(4)}`
}

export type TypedCodeProblem = 'too-short' | 'too-long' | 'not-a-sign' | 'check-sign'

/** Reads what was typed: any case, spaces and hyphens of any sort, O for 0 and I or L for 1; or what is wrong with it. */
export function readTypedCode(
  text: string,
): { readonly ok: true; readonly code: string } | { readonly ok: false; readonly problem: TypedCodeProblem } {
  // Cut before anything else: what was pasted may be a book.
  const signs = text
    .slice(0, MOST_TYPED)
    .replace(/[\s\u2010-\u2015-]/g, '')
    .toUpperCase()
    .replace(/O/g, '0')
    .replace(/[IL]/g, '1')
  const values = Array.from(signs, (sign) => ALPHABET.indexOf(sign))
  if (values.includes(-1)) return { ok: false, problem: 'not-a-sign' }
  if (values.length < TYPED_CODE_LENGTH) return { ok: false, problem: 'too-short' }
  if (values.length > TYPED_CODE_LENGTH) return { ok: false, problem: 'too-long' }
  const isRight = checkSign(values.slice(0, DATA_LENGTH)) === values[DATA_LENGTH]
  return isRight ? { ok: true, code: signs } : { ok: false, problem: 'check-sign' }
}

/** As `readTypedCode`, where only a whole code is of use. */
export function parseTypedCode(text: string): string | null {
  const read = readTypedCode(text)
  return read.ok ? read.code : null
}

/**
 * Sum of αⁱ·xᵢ in GF(32), i from 1. The weights are different powers of a generator and none is 1 (the check sign's own weight),
 * so one wrong sign changes the sum, and so does any swap of two unequal signs.
 */
function checkSign(values: readonly number[]): number {
  let weight = 1
  let sum = 0
  for (const value of values) {
    weight = multiply(weight, 2)
    sum ^= multiply(weight, value)
  }
  return sum
}

/** Product in GF(32) with the primitive polynomial x⁵ + x² + 1. */
function multiply(a: number, b: number): number {
  let product = 0
  for (let bit = 0, factor = a; bit < 5; bit += 1) {
    if (b & (1 << bit)) product ^= factor
    factor = factor & 16 ? (factor << 1) ^ 0b100101 : factor << 1
  }
  return product
}
