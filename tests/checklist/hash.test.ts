import { readFileSync, readdirSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { hashJson, paramsHash, sha256Hex } from '@/lib/checklist/hash'

describe('SHA-256', () => {
  // FIPS 180-4 examples.
  test.each([
    ['', 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855'],
    ['abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
  ])('of %j is the published value, as text and as bytes', (text, hex) => {
    expect(sha256Hex(text)).toBe(hex)
    expect(sha256Hex(new TextEncoder().encode(text))).toBe(hex)
  })
})

describe('the hash of a JSON value', () => {
  test('is taken over its canonical form: keys sorted, no white space (RFC 8785)', () => {
    expect(hashJson({ b: [1.0, 'é'], a: null })).toBe(sha256Hex('{"a":null,"b":[1,"é"]}'))
  })

  test('does not change with the order of keys, and does with a value or the order of a list', () => {
    expect(hashJson({ a: 1, b: 2 })).toBe(hashJson({ b: 2, a: 1 }))
    expect(hashJson({ a: 1 })).not.toBe(hashJson({ a: 2 }))
    expect(hashJson([1, 2])).not.toBe(hashJson([2, 1]))
  })

  test.each([undefined, Number.NaN, Number.POSITIVE_INFINITY])('%s is refused, not hashed', (value) => {
    expect(() => hashJson(value)).toThrow()
  })

  test('equal limits of two rules have two hashes', () => {
    expect(paramsHash('tyre-age', { limit: 1 })).not.toBe(paramsHash('tyre-tread', { limit: 1 }))
  })
})

test('canonical JSON is made in one place: nobody but lib/checklist/hash.ts imports the package', () => {
  const root = new URL('../../', import.meta.url)
  const importers = ['lib', 'app', 'db'].flatMap((folder) =>
    readdirSync(new URL(`${folder}/`, root), { recursive: true, encoding: 'utf8' })
      .filter((file) => /\.tsx?$/.test(file))
      .map((file) => `${folder}/${file}`)
      .filter((file) => /from 'canonicalize'/.test(readFileSync(new URL(file, root), 'utf8'))),
  )
  expect(importers).toEqual(['lib/checklist/hash.ts'])
})
