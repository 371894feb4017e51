import Database from 'better-sqlite3'
import { randomUUID } from 'node:crypto'
import { resolve } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { launchBrowser } from '../support/browser'
import { signInOn } from '../support/crew-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import { step, watchPage, type WatchedPage } from '../support/watch-page'

const MESSY = resolve(import.meta.dirname, '../fixtures/entries-messy.csv')

let seeded: SeededServer
let browser: Browser
let office: WatchedPage
let event: string

beforeAll(async () => {
  seeded = await startSeededServer('messy-list')
  event = anEmptyEvent()
  browser = await launchBrowser()
  office = await anOrganiser('office', `/events/${event}/import`)
})

afterAll(async () => {
  await browser.close()
  await seeded.end(seeded.server)
})

test('the messy list goes in whole once its cells are put right and its questions answered, and not before', async () => {
  const { page } = office
  await step('it is looked through', [office], async () => {
    await choose(page, MESSY)
    await page.getByText('6 problems in entries-messy.csv: nothing can be imported yet.').waitFor()
    await page.getByRole('heading', { name: '6 questions' }).waitFor()
  })
  expect(await page.getByRole('button', { name: /^Import/ }).count()).toBe(0)

  await step('cells are put right, one row is left out', [office], async () => {
    await page.getByLabel('Row 7, e-mail, put right').fill('thea.dorrell@example.org')
    await page.getByLabel('Leave row 20 out').check()
    await page.getByLabel('Row 21, passengers, put right').fill('1')
    await page.getByLabel('Row 22, passengers, put right').fill('0')
    await page.getByLabel('Row 29, car, put right').fill('Tarn 2')
    await page.getByLabel('Row 30, notes, put right').fill('long story')
  })
  await step('the questions are answered', [office], async () => {
    await answer(page, '“INTER” is no run group', 'It is Intermediate')
    await answer(page, '“adv.” is no run group', 'It is Advanced')
    await answer(page, '“Beginners” is no run group', 'It is Novice')
    await answer(page, 'Row 10 has number 6', 'They are two cars')
    await page
      .getByRole('group', { name: /^Row 10 has number 6/ })
      .getByLabel('Number of the second car')
      .fill('61')
    await answer(page, 'Row 26 has plate SP53 NLL', 'They share one car')
    await answer(page, 'Row 100 says the same as row 32', 'Leave row 100 out')
    expect(rowsOf('entry')).toBe(0)
    await page.getByRole('button', { name: 'Look it through with these answers' }).click()
    await page.getByText('Hana Gosling drives entry 189 too').waitFor()
  })
  await step('it is imported', [office], async () => {
    await page.getByRole('button', { name: 'Import 94 entries' }).click()
    await page.getByText('entries-messy.csv is imported: 94 entries added, 0 changed, 0 as they were.').waitFor()
  })

  expect([rowsOf('entry'), rowsOf('person')]).toEqual([94, 95])
  expect(office.complaints()).toEqual([])
})

test('columns that are not sure are said by hand before anything is read', async () => {
  const { page } = office
  const list = 'Startnummer;Vorname;Name;Auto;Farbe;Kennzeichen;Kurs\n900;Ida;Rook;Tessier Petite;rot;ZZ10 AAA;Novice\n'
  await step('the list is chosen', [office], async () => {
    await page.goto(`${seeded.server.origin}/events/${event}/import`)
    await choose(page, { name: 'anmeldung.csv', mimeType: 'text/csv', buffer: Buffer.from(list) })
    await page.getByText('Say what the columns are', { exact: true }).waitFor()
  })
  expect(await page.getByRole('button', { name: /^Import/ }).count()).toBe(0)
  await step('it is mapped', [office], async () => {
    await page.getByLabel('Column 7, Kurs, is the').selectOption('run group')
    await page.getByRole('button', { name: 'Read it with these columns' }).click()
    await page.getByRole('button', { name: 'Import 1 entry' }).click()
    await page.getByText('anmeldung.csv is imported: 1 entry added').waitFor()
  })
  expect(rowsOf('entry')).toBe(95)
})

test('an entry is found, edited by two at once, and the second is told what the first changed', async () => {
  const { page } = office
  const other = await anOrganiser('another desk', `/events/${event}/entries`)
  await step('both open entry 007', [office, other], async () => {
    for (const desk of [page, other.page]) await openEntry(desk, '007')
  })
  await step('the first changes number and people', [office], async () => {
    await page.getByLabel('Number', { exact: true }).fill('700')
    await page.getByRole('button', { name: 'Add somebody new' }).click()
    await page.getByLabel('Name', { exact: true }).last().fill('Ina Stone')
    await page.getByLabel('Is the').last().selectOption('instructor')
    await page.getByRole('button', { name: 'Save' }).click()
    await page.getByText('Saved: number, people.').waitFor()
    await page.getByRole('listitem').filter({ hasText: 'Changed number, people' }).waitFor()
  })
  await step('the second is told, and keeps what was typed', [other], async () => {
    await other.page.getByLabel('Colour').fill('gold')
    await other.page.getByRole('button', { name: 'Save' }).click()
    await other.page.getByText(/^Dorian Marsh changed number, people at \d\d:\d\d, while you were editing\.$/).waitFor()
    await other.page.getByText('Now: 700').waitFor()
  })
  expect(await other.page.getByLabel('Colour').inputValue()).toBe('gold')
  await step('having looked, the second takes theirs and saves the colour alone', [other], async () => {
    await other.page.getByRole('button', { name: 'Take theirs instead' }).click()
    await other.page.getByLabel('Colour').fill('gold')
    await other.page.getByRole('button', { name: 'Save' }).click()
    await other.page.getByText('Saved: colour.').waitFor()
  })
  expect(entryNow('700')).toEqual({ number: '700', colour: 'gold', version: 3 })
  expect(office.complaints()).toEqual([])
})

async function anOrganiser(name: string, path: string): Promise<WatchedPage> {
  const watched = watchPage(await (await browser.newContext({ viewport: { width: 1280, height: 900 } })).newPage(), name)
  await signInOn(watched.page, seeded.server.origin, { email: 'organiser@marram.example', password: seeded.password }, path)
  return watched
}

async function choose(page: Page, file: Parameters<ReturnType<Page['getByLabel']>['setInputFiles']>[0]): Promise<void> {
  await page.getByLabel(/^Choose an(other file| entry list)$/).setInputFiles(file)
  await page.getByRole('heading', { name: /^Dry run of/ }).waitFor()
}

async function answer(page: Page, asks: string, option: string): Promise<void> {
  await page
    .getByRole('group', { name: new RegExp(`^${asks}`) })
    .getByRole('radio', { name: new RegExp(`^${option}`) })
    .check()
}

/** Finds it by its number, goes to it by the keyboard and opens it. */
async function openEntry(page: Page, number: string): Promise<void> {
  await page.goto(`${seeded.server.origin}/events/${event}/entries`)
  // What is typed before the page is alive is not heard: typed again until it is.
  await expect
    .poll(
      async () => {
        await page.getByLabel('Find').fill('')
        await page.getByLabel('Find').fill(number)
        return page.getByText(/^1 of \d+ entries$/).isVisible()
      },
      { timeout: 20_000 },
    )
    .toBe(true)
  await page.getByRole('link', { name: `Entry ${number}` }).focus()
  await page.keyboard.press('Enter')
  await page.getByRole('heading', { name: 'What became of it' }).waitFor()
}

/** An event of the demo club without entries, beside the demo's own. */
function anEmptyEvent(): string {
  const database = new Database(seeded.server.db)
  const id = randomUUID()
  const own = database.prepare('SELECT * FROM event WHERE id = ?').get(seeded.event) as Record<string, unknown>
  const row: Record<string, unknown> = {
    ...own,
    id,
    code: Number(own.code) + 100,
    name: 'The messy day',
    next_kid: 1,
    next_entry_code: 1,
    snapshot_version: 1,
  }
  insert(database, 'event', row)
  const groups = database.prepare('SELECT * FROM run_group WHERE event_id = ?').all(seeded.event) as Record<string, unknown>[]
  for (const group of groups) insert(database, 'run_group', { ...group, id: randomUUID(), event_id: id })
  database.close()
  return id
}

function insert(database: Database.Database, table: string, row: Record<string, unknown>): void {
  const columns = Object.keys(row)
  database
    .prepare(`INSERT INTO ${table} (${columns.map((column) => `"${column}"`).join(', ')}) VALUES (${columns.map(() => '?').join(', ')})`)
    .run(Object.values(row))
}

function rowsOf(table: 'entry' | 'person'): number {
  return read<{ readonly count: number }>(`SELECT count(*) AS count FROM ${table} WHERE event_id = ?`, event).count
}

function entryNow(number: string): unknown {
  return read(
    'SELECT entry.number, car.colour, entry.version FROM entry JOIN car ON car.id = entry.car_id WHERE entry.event_id = ? AND entry.number = ?',
    event,
    number,
  )
}

function read<T>(query: string, ...values: readonly string[]): T {
  const database = new Database(seeded.server.db, { readonly: true })
  const row = database.prepare(query).get(...values) as T
  database.close()
  return row
}
