import { readdirSync, readFileSync } from 'node:fs'
import { expect, test } from 'vitest'

const SPEC = new URL('../../lib/pass/SPEC.md', import.meta.url)
const TESTS = new URL('./', import.meta.url)

const stated = new Set([...readFileSync(SPEC, 'utf8').matchAll(/^- \*\*([A-Z]\d+)\*\*/gm)].map((match) => match[1] as string))
const sources = readdirSync(TESTS)
  .filter((name) => name.endsWith('.test.ts') && name !== 'spec.test.ts')
  .map((name) => readFileSync(new URL(name, TESTS), 'utf8'))
/** Ids at the start of a title, however the test is declared. */
const quoted = new Set(sources.flatMap((source) => [...source.matchAll(/['"`]\[([A-Z]\d+)\] /g)].map((match) => match[1] as string)))

test('SPEC.md states every rule of the pit exit', () => {
  expect([...stated].sort()).toEqual(Array.from({ length: 8 }, (_, index) => `P${index + 1}`))
})

test('every rule that SPEC.md states is quoted by a test title here', () => {
  expect([...stated].filter((id) => !quoted.has(id))).toEqual([])
})

test('no test title here quotes a rule that SPEC.md does not state', () => {
  expect([...quoted].filter((id) => !stated.has(id))).toEqual([])
})
