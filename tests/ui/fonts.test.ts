import { readdirSync, readFileSync, statSync } from 'node:fs'
import { expect, test } from 'vitest'

const FOLDER = 'app/_ui/fonts'
const files = readdirSync(FOLDER).filter((name) => name.endsWith('.woff2'))

test('all fonts together weigh 160 KB or less', () => {
  expect(files.length).toBe(6)
  expect(files.reduce((sum, name) => sum + statSync(`${FOLDER}/${name}`).size, 0)).toBeLessThanOrEqual(160_000)
})

test('every font file is declared, and each family has its licence beside it', () => {
  const declared = readFileSync(`${FOLDER}/fonts.ts`, 'utf8')

  expect(files.filter((name) => !declared.includes(`./${name}`))).toEqual([])
  for (const family of ['archivo', 'atkinson-hyperlegible-next', 'atkinson-hyperlegible-mono']) {
    expect(readFileSync(`${FOLDER}/${family}.LICENSE.txt`, 'utf8')).toContain('SIL Open Font License, Version 1.1')
  }
})
