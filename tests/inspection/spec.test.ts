import { readFileSync, readdirSync } from 'node:fs'
import { expect, test } from 'vitest'

const SPEC = new URL('../../lib/inspection/SPEC.md', import.meta.url)
const TESTS = new URL('./', import.meta.url)

const stated = new Set([...readFileSync(SPEC, 'utf8').matchAll(/^- \*\*([A-Z]\d+)\*\*/gm)].map((match) => match[1] as string))
const titles = readdirSync(TESTS)
  .filter((name) => name.endsWith('.test.ts'))
  .flatMap((name) => [
    ...readFileSync(new URL(name, TESTS), 'utf8').matchAll(
      /\b(?:test|describe)(?:\.each\b[\s\S]*?\]\s*(?:as const)?,?\s*\))?\(\s*(['"`])(.*?)\1/g,
    ),
  ])
  .map((match) => match[2] as string)
const quoted = new Set(titles.flatMap((title) => [...title.matchAll(/\[([A-Z]\d+)\]/g)].map((match) => match[1] as string)))

test('SPEC.md states every rule of meaning, and those of making and trust that the fold keeps', () => {
  const meaning = Array.from({ length: 14 }, (_, index) => `F${index + 1}`)
  expect([...stated].sort()).toEqual([...meaning, 'M5', 'T1', 'T3'].sort())
})

test('every rule that SPEC.md states is quoted by a test title here', () => {
  expect([...stated].filter((id) => !quoted.has(id))).toEqual([])
})

test('no test title here quotes a rule that SPEC.md does not state', () => {
  expect([...quoted].filter((id) => !stated.has(id))).toEqual([])
})
