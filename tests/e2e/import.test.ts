import Database from 'better-sqlite3'
import { readFileSync } from 'node:fs'
import { resolve } from 'node:path'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { launchBrowser } from '../support/browser'
import { signInOn } from '../support/crew-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import { step, watchPage, type WatchedPage } from '../support/watch-page'

const CLEAN = readFileSync(resolve(import.meta.dirname, '../fixtures/entries-clean.csv'), 'utf8')
const [HEAD = ''] = CLEAN.split('\n')

let seeded: SeededServer
let browser: Browser
let office: WatchedPage

beforeAll(async () => {
  seeded = await startSeededServer('import')
  browser = await launchBrowser()
  office = watchPage(await (await browser.newContext({ viewport: { width: 1280, height: 900 } })).newPage(), 'office')
  const organiser = { email: 'organiser@marram.example', password: seeded.password }
  await signInOn(office.page, seeded.server.origin, organiser, `/events/${seeded.event}/import`)
})

afterAll(async () => {
  await browser.close()
  await seeded.end(seeded.server)
})

test('a broken list commits nothing, and names row and column of each problem as the spreadsheet shows them', async () => {
  const before = entriesInDatabase()
  const rows = ['900,Ida,Rook,ida.rook@example.org,,Tessier Petite,red,ZZ10 AAA,Novice,0,', '', ',Ada,Norcott,,,Tessier Petite,red,ZZ11 AAA,Novice,0,', '901,Bo,Lind,not-an-address,,Tessier Petite,red,ZZ12 AAA,Novice,0,'] // prettier-ignore

  await step('the broken list is looked through', [office], async () => {
    await choose('broken.csv', [HEAD, ...rows].join('\n'))
    await office.page.getByText('2 problems in broken.csv: nothing can be imported yet.').waitFor()
    await office.page.getByText('Nothing was imported. A list goes in whole or not at all.').waitFor()
  })

  const told = await office.page.getByRole('table', { name: 'Problems' }).getByRole('row').allInnerTexts()
  expect(told.slice(1).map((row) => row.split('\t').slice(0, 3))).toEqual([
    ['4', 'entry number', 'empty'],
    ['5', 'e-mail', 'not-an-address'],
  ])
  expect(await office.page.getByRole('button', { name: /^Import/ }).count()).toBe(0)
  expect(entriesInDatabase()).toEqual(before)
  expect(before).toHaveLength(142)
})

test('the list that is imported already would change nothing: 142 the same', async () => {
  await step('the clean list is looked through', [office], async () => {
    await choose('entries-clean.csv', CLEAN)
    await office.page.getByText('Nothing to import: every entry of this list is here as it stands in it.').waitFor()
  })

  expect(await counts()).toEqual({ 'would be added': '0', 'would be changed': '0', 'already the same': '142', problems: '0' })
})

test('a list with one new entry adds that one, once, and only when it is pressed', async () => {
  const line = '900,Ida,Rook,ida.rook@example.org,,Tessier Petite,red,ZZ10 AAA,Novice,0,'

  await step('the longer list is looked through', [office], async () => {
    await choose('longer.csv', `${CLEAN.trimEnd()}\n${line}\n`)
    await office.page.getByText('Nothing has been written.').waitFor()
    expect(await counts()).toMatchObject({ 'would be added': '1', 'already the same': '142' })
    expect(entriesInDatabase()).toHaveLength(142)
  })
  await step('it is imported', [office], async () => {
    await office.page.getByRole('button', { name: 'Import 1 entry' }).click()
    await office.page.getByText('longer.csv is imported: 1 entry added, 0 changed, 142 as they were.').waitFor()
  })

  expect(entriesInDatabase()).toHaveLength(143)
  expect(office.complaints()).toEqual([])
})

async function choose(name: string, text: string): Promise<void> {
  await office.page
    .getByLabel(/^Choose an(other file| entry list)$/)
    .setInputFiles({ name, mimeType: 'text/csv', buffer: Buffer.from(text) })
  await office.page.getByRole('heading', { name: `Dry run of ${name}` }).waitFor()
}

/** The figures of the dry run by what they count. */
async function counts(): Promise<Readonly<Record<string, string>>> {
  const [words, figures] = await Promise.all(['term', 'definition'].map((role) => office.page.getByRole(role as 'term').allInnerTexts()))
  return Object.fromEntries((words ?? []).map((word, index) => [word, figures?.[index] ?? '']))
}

function entriesInDatabase(): readonly unknown[] {
  const database = new Database(seeded.server.db, { readonly: true })
  const rows = database.prepare('SELECT * FROM entry ORDER BY id').all()
  database.close()
  return rows
}
