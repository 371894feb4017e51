import Database from 'better-sqlite3'
import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { resolve } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest'
import { present, walkOn } from '../support/bay-walk'
import { launchBrowser } from '../support/browser'
import { becomeCrewDevice, unsentOnStrip, waitForOfflineShells } from '../support/crew-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import type { RunningServer } from '../support/server-process'
import { step, watchPage, type WatchedPage } from '../support/watch-page'

const YEAR = new Date().getUTCFullYear()
const GOOD_HELMET = { label: 'fia-8859-2015', secondLabel: 'none', face: 'full', madeYear: String(YEAR - 2), impact: 'no' }
const OLD_HELMET = { ...GOOD_HELMET, label: 'snell-sa2005' }
const A = { number: '263', driver: 'Idris Falkner' }
const CONSENT = 'Under age: consent signed by a parent or guardian'
const BAND = 'Number on the band you put on'

let seeded: SeededServer
let server: RunningServer
let browser: Browser
let desk: WatchedPage

beforeAll(async () => {
  browser = await launchBrowser()
  seeded = await startSeededServer('sign-on-desk')
  server = seeded.server
  layOutPapers()
  const context = await browser.newContext({ viewport: { width: 390, height: 844 } })
  desk = watchPage(await context.newPage(), 'desk')
})

afterAll(async () => {
  await browser.close()
  await seeded.end(server)
})

afterEach(() => {
  expect(desk.complaints(), `console of the desk: ${desk.complaints().join(' | ')}`).toEqual([])
})

// The tests below are one morning at the desk, told in order.

test('[M1] with the server killed the desk ticks five at a briefing, judges a helmet, bands its driver, seats a minor and refuses them a band', async () => {
  const { page } = desk
  await onDesk('the desk loads the day', async () => {
    const as = { email: 'sign-on@marram.example', password: seeded.password, post: 'sign-on', device: 'desk phone' } as const
    await becomeCrewDevice(page, server.origin, as)
    await page.getByRole('heading', { name: 'Still missing' }).waitFor()
    await waitForOfflineShells(page)
  })
  desk.expectCutOff(true)
  await server.kill()
  await page.context().setOffline(true)

  await onDesk('five were at the briefing', async () => {
    await page.getByRole('button', { name: 'Who was at a briefing' }).click()
    const other = page.getByRole('radio', { name: 'Another time' })
    if ((await other.count()) > 0) await other.check()
    await page.getByLabel('Time of the briefing').fill('08:15')
    for (let index = 0; index < 5; index += 1) await page.getByRole('checkbox').nth(index).check()
    await page.getByRole('button', { name: '5 at the 08:15 briefing' }).click()
    await page.getByText('Saved: 5 people were at the 08:15 briefing').waitFor()
    expect(await unsentOnStrip(page)).toBe(10)
    await page.getByRole('button', { name: 'Back to sign-on' }).click()
  })

  await onDesk('the driver of A is signed on, his helmet judged as it is typed', async () => {
    await find(page, A.number)
    await page.getByRole('heading', { level: 1, name: A.driver }).waitFor()
    await present(page, { openCar: false, headRestraintWorn: false })
    expect(await page.getByText(/No band yet/).count()).toBe(1)
    expect(await page.getByLabel(BAND).count()).toBe(0)
    await walkOn(page, GOOD_HELMET, { 'kit/helmet.label': judgesOldFirst })
    await band(page, '417')
  })

  await onDesk('a passenger who is under age turns up for A, and gets no band without a consent', async () => {
    await page.getByRole('button', { name: 'Another person' }).click()
    await page.getByRole('button', { name: 'Somebody turned up' }).click()
    await page.getByLabel('First and last name').fill('Lio Brandt')
    await page.getByRole('radio', { name: 'Passenger' }).check()
    await page.getByRole('radio', { name: 'Yes' }).check()
    await page.getByLabel('Car number or plate').fill(A.number)
    await page.keyboard.press('Enter')
    await page.getByRole('button', { name: 'Put into the car' }).click()
    await page.getByRole('heading', { level: 1, name: 'Lio Brandt' }).waitFor()
    await present(page, { openCar: false, headRestraintWorn: false })
    await page.getByRole('button', { name: /^Go on: Papers/ }).click()
    const rest = page.getByRole('region', { name: 'The rest of this place' })
    await rest.getByRole('button', { name: CONSENT }).click()
    await page.getByRole('button', { name: 'Not so' }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'No consent', exact: true }).click()
    await page.getByText(/^Saved: consent: fail/).waitFor()
    await page.getByRole('button', { name: 'All places' }).click()
    await walkOn(page, GOOD_HELMET)
    await page
      .getByRole('status')
      .filter({ hasText: /^not passed$/ })
      .waitFor()
    expect(await page.locator('[data-slot=not-yet]').innerText()).toContain('consent')
    expect(await page.getByLabel(BAND).count()).toBe(0)
  })

  await onDesk('a reload with no network and no server keeps all of it', async () => {
    const unsent = await unsentOnStrip(page)
    const answer = await page.reload()
    expect(answer?.fromServiceWorker()).toBe(true)
    await page.getByRole('heading', { level: 1, name: 'Lio Brandt' }).waitFor()
    expect(await unsentOnStrip(page)).toBe(unsent)
  })
})

test('[S3] the server returns: all is there and accepted, the newcomer has a row, and another device knows who may go', async () => {
  const { page } = desk
  server = await server.restart()
  await onDesk('everything is sent', async () => {
    await page.context().setOffline(false)
    await page.locator('[data-slot=strip]').filter({ hasText: 'all sent' }).waitFor()
    desk.expectCutOff(false)
  })

  const database = new Database(server.db, { readonly: true })
  const rows = database.prepare<[], { kind: string; disposition: string }>('SELECT kind, disposition FROM record').all()
  const seats = database.prepare('SELECT p.name, p.minor, s.role FROM person p JOIN entry_person s ON s.person_id = p.id WHERE p.name = ?')
  expect(seats.all('Lio Brandt')).toEqual([{ name: 'Lio Brandt', minor: 1, role: 'passenger' }])
  database.close()
  expect(rows.filter(({ disposition }) => disposition !== 'accepted')).toEqual([])
  expect(rows.filter(({ kind }) => kind === 'band')).toHaveLength(1)
  expect(rows.filter(({ kind }) => kind === 'entry-changed')).toHaveLength(1)

  const pit = watchPage(await (await browser.newContext({ viewport: { width: 390, height: 844 } })).newPage(), 'pit exit')
  await step('the pit exit loads the day', [desk, pit], async () => {
    const as = { email: 'marshal@marram.example', password: seeded.password, post: 'pit-exit', device: 'pit-exit phone' } as const
    await becomeCrewDevice(pit.page, server.origin, as)
    await pit.page.goto(`${server.origin}/sign-on`)
    await pit.page.getByLabel('Name, car number or plate').fill(A.number)
    await pit.page.getByRole('button', { name: new RegExp(`${A.driver}.*band 417`) }).waitFor()
    await pit.page.getByRole('button', { name: /Lio Brandt.*passenger.*not passed/ }).waitFor()
  })
  const people = await listedPeople(pit.page, A.number)
  expect(people).toEqual([
    { name: A.driver, role: 'driver', band: 'live', bandNumber: '417' },
    { name: 'Lio Brandt', role: 'passenger', band: 'none', bandNumber: null },
  ])
  expect(pit.complaints()).toEqual([])
})

async function judgesOldFirst(page: Page): Promise<number> {
  const panel = page.locator('section[aria-labelledby=check-prompt]')
  await choose(page, OLD_HELMET)
  expect(await panel.getByRole('button', { name: 'Seen so' }).isDisabled()).toBe(true)
  await choose(page, GOOD_HELMET)
  await panel.getByRole('button', { name: 'Seen so' }).click()
  await page.getByText(/^Saved: helmet label: ok/).waitFor()
  return 1
}

/** Chooses the helmet's label as its list has it, and the rest of what is read on it. */
async function choose(page: Page, values: Readonly<Record<string, string>>): Promise<void> {
  const check = person('helmet.label')
  for (const field of check.measure ?? []) {
    const value = values[field.id]
    if (value === undefined) continue
    if (field.kind === 'number') {
      const keypad = page.getByRole('textbox', { name: field.label })
      if ((await keypad.count()) === 0) await page.getByRole('button', { name: field.label }).click()
      await keypad.fill(value)
      await page.getByRole('button', { name: /^(Next value|Done)$/ }).click()
      continue
    }
    const label = field.options?.find(({ id }) => id === value)?.label ?? ''
    const list = page.getByRole('combobox', { name: field.label, exact: true })
    if ((await list.count()) > 0) await list.selectOption({ label })
    else await page.getByRole('group', { name: field.label, exact: true }).getByRole('radio', { name: label, exact: true }).check()
  }
}

async function find(page: Page, asked: string): Promise<void> {
  await page.getByLabel('Name, car number or plate').fill(asked)
  await page.keyboard.press('Enter')
}

async function band(page: Page, number: string): Promise<void> {
  await page.getByLabel(BAND).fill(number)
  await page.getByRole('button', { name: 'Band is on' }).click()
  await page.getByRole('region', { name: 'Band' }).getByText(`Band ${number}`).waitFor()
}

function onDesk<T>(title: string, work: () => Promise<T>): Promise<T> {
  return step(title, [desk], work)
}

/** The people of a car on the pass list that this device has on its disk, which is what the pit exit answers from. */
function listedPeople(page: Page, number: string): Promise<unknown> {
  return page.evaluate(async (wanted) => {
    const [{ name = '' } = {}] = (await indexedDB.databases()).filter((one) =>
      /^lockwire-[0-9a-f-]{36}-[0-9a-f-]{36}$/.test(one.name ?? ''),
    )
    const open = <T>(request: IDBRequest<T>) =>
      new Promise<T>((done, failed) => {
        request.onsuccess = () => done(request.result)
        request.onerror = () => failed(new Error(request.error?.message))
      })
    const database = await open(indexedDB.open(name))
    for (const store of database.objectStoreNames) {
      const all = (await open(database.transaction(store).objectStore(store).getAll())) as {
        entries?: { number: string; people?: { name: string }[] }[]
        keys?: unknown
      }[]
      const list = all.find((value) => Array.isArray(value?.entries) && Array.isArray(value?.keys))
      const people = list?.entries?.find((entry) => entry.number === wanted)?.people as
        { name: string; role: string; band: string; bandNumber: string | null }[] | undefined
      if (people) return people.map(({ name: who, role, band, bandNumber }) => ({ name: who, role, band, bandNumber }))
    }
    return null
  }, number)
}

interface PersonCheck {
  readonly id: string
  readonly measure?: readonly {
    readonly id: string
    readonly kind: string
    readonly label: string
    readonly options?: readonly { readonly id: string; readonly label: string }[]
  }[]
}

function papersFile(): string {
  return readFileSync(resolve(import.meta.dirname, '../../checklists/closed-circuit/v2.json'), 'utf8')
}

function person(id: string): PersonCheck {
  const { checks } = JSON.parse(papersFile()) as { readonly checks: readonly PersonCheck[] }
  const found = checks.find((check) => check.id === id)
  if (found === undefined) throw new Error(`the checklist knows no ${id}`)
  return found
}

/** The event looks by the second version of the checklist, the first with papers, before anybody loads its day. */
function layOutPapers(): void {
  const body = papersFile()
  const hash = createHash('sha256').update(body).digest('hex')
  const database = new Database(server.db)
  database
    .prepare('INSERT INTO checklist_text (hash, body) SELECT ?, ? WHERE NOT EXISTS (SELECT 1 FROM checklist_text WHERE hash = ?)')
    .run(hash, body, hash)
  database.prepare('UPDATE event SET checklist_hash = ?, snapshot_version = snapshot_version + 1 WHERE id = ?').run(hash, seeded.event)
  database.close()
}
