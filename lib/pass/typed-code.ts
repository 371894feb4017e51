import { sha256 } from '@noble/hashes/sha2.js'

/** 32 signs without I, L, O and U, which are misread. */
const ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'
const DATA_LENGTH = 7
export const TYPED_CODE_LENGTH = DATA_LENGTH + 1

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

/** Reads what was typed: any case, spaces and hyphens, O for 0 and I or L for 1. Null where a sign is wrong, missing or swapped. */
export function parseTypedCode(text: string): string | null {
  const signs = text.toUpperCase().replace(/[\s-]/g, '').replace(/O/g, '0').replace(/[IL]/g, '1')
  if (signs.length !== TYPED_CODE_LENGTH) return null
  const values = [...signs].map((sign) => ALPHABET.indexOf(sign))
  if (values.includes(-1)) return null
  return checkSign(values.slice(0, DATA_LENGTH)) === values[DATA_LENGTH] ? signs : null
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
