import { readFileSync, readdirSync } from 'node:fs'
import { expect, test } from 'vitest'

const SPEC = new URL('../../lib/sync/SPEC.md', import.meta.url)
const FOLDERS = [
  { url: new URL('./', import.meta.url), starts: '' },
  { url: new URL('../server/', import.meta.url), starts: 'sync-' },
]

const stated = new Set([...readFileSync(SPEC, 'utf8').matchAll(/^- \*\*([A-Z]\d+)\*\*/gm)].map((match) => match[1] as string))
const sources = FOLDERS.flatMap(({ url, starts }) =>
  readdirSync(url)
    .filter((name) => name.startsWith(starts) && (name.endsWith('.test.ts') || name === 'store-contract.ts') && name !== 'spec.test.ts')
    .map((name) => readFileSync(new URL(name, url), 'utf8')),
)
/** Rule ids at the start of a title, however the test is declared. */
const quoted = new Set(sources.flatMap((source) => [...source.matchAll(/['"`]\[([A-Z]\d+)\] /g)].map((match) => match[1] as string)))

test('SPEC.md states every rule of making, trust and travelling that this part keeps', () => {
  const ids = (letter: string, count: number) => Array.from({ length: count }, (_, index) => `${letter}${index + 1}`)
  expect([...stated].sort()).toEqual([...ids('M', 5), ...ids('S', 9), ...ids('T', 4)].sort())
})

test('every rule that SPEC.md states is quoted by a test title', () => {
  expect([...stated].filter((id) => !quoted.has(id))).toEqual([])
})

test('no test title quotes a rule that SPEC.md does not state', () => {
  expect([...quoted].filter((id) => !stated.has(id))).toEqual([])
})
