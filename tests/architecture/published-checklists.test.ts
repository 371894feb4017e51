import { createHash } from 'node:crypto'
import { readFileSync, readdirSync } from 'node:fs'
import { expect, test } from 'vitest'

const FOLDER = new URL('../../checklists/', import.meta.url)
const published = JSON.parse(readFileSync(new URL('published.json', FOLDER), 'utf8')) as Record<string, string>

const files = readdirSync(FOLDER, { recursive: true, encoding: 'utf8' }).filter(
  (file) => file.endsWith('.json') && file !== 'published.json',
)

/** What a changed file is told; null where it is as it was published. */
function complaint(file: string, bytes: Uint8Array): string | null {
  if (published[file] === undefined)
    return `${file} is not in checklists/published.json: add it with its SHA-256 (sha256sum, run in checklists/)`
  if (createHash('sha256').update(bytes).digest('hex') === published[file]) return null
  return `${file} was published and records pin its hash, so it can never change again. Put it back as it was and make a new version beside it: see checklists/README.md`
}

test('there are published checklists and limits to look at', () => {
  expect(files).toEqual(expect.arrayContaining(['closed-circuit/v1.json', 'limits/track-day.json']))
})

test.each(files)('%s is byte for byte what was published', (file) => {
  expect(complaint(file, readFileSync(new URL(file, FOLDER)))).toBeNull()
})

test('nothing that was published has gone', () => {
  expect(Object.keys(published).filter((file) => !files.includes(file))).toEqual([])
})

test('one changed byte is told to become a new version', () => {
  const text = readFileSync(new URL('closed-circuit/v1.json', FOLDER), 'utf8')
  expect(complaint('closed-circuit/v1.json', new TextEncoder().encode(`${text} `))).toMatch(/make a new version/)
})

test('a file nobody published is told to be added', () => {
  expect(complaint('closed-circuit/v9.json', new Uint8Array())).toMatch(/add it with its SHA-256/)
})

test('a checklist lies where its id and version say', () => {
  for (const file of files.filter((each) => !each.startsWith('limits/'))) {
    const { id, version } = JSON.parse(readFileSync(new URL(file, FOLDER), 'utf8')) as { id: string; version: number }
    expect(file).toBe(`${id}/v${version}.json`)
  }
})
