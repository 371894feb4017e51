import { createHash, randomBytes } from 'node:crypto'
import Database from 'better-sqlite3'
import type { Browser } from 'playwright-core'
import sharp from 'sharp'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { findCar, present } from '../support/bay-walk'
import { launchBrowser } from '../support/browser'
import { becomeCrewDevice, signInOn } from '../support/crew-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import { step, watchPage, type WatchedPage } from '../support/watch-page'

const PHONE = { width: 390, height: 844 }
const LABELS = 'A readable label on every strap, one set, in date'

let seeded: SeededServer
let browser: Browser
let phone: WatchedPage

beforeAll(async () => {
  seeded = await startSeededServer('entrant')
  browser = await launchBrowser()
  phone = watchPage(await (await browser.newContext({ viewport: PHONE })).newPage(), 'entrant')
})

afterAll(async () => {
  await browser.close()
  await seeded.end(seeded.server)
})

test('from the link in the mail to a signed declaration: what would not be passed is told at home and mended, and the bay sees it', async () => {
  const { page } = phone
  const link = aLink()

  await step('the link is looked at, and only then gone on with', [phone], async () => {
    await page.goto(`${seeded.server.origin}/entry/${link}`)
    await page.getByText('for Jory Tamsin').waitFor()
    expect((await page.context().cookies()).length).toBe(0)
    await page.getByRole('button', { name: 'Go on' }).click()
    await page.getByRole('heading', { name: 'Entry code' }).waitFor()
    await page.getByText('Not declared').waitFor()
  })

  await step('last year’s belts would not be passed, with figure and limit', [phone], async () => {
    await page.getByRole('link', { name: 'Declare the car' }).click()
    const card = page.getByRole('region', { name: LABELS })
    await card.getByText('As declared: would not be passed.').waitFor()
    await card.getByText(/last valid day Wed 31 December 2025|last valid day \w{3} 31 December \d{4}/).waitFor()
    await card.getByText('Bring belts whose labels are in date').waitFor()
    expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBe(0)
  })

  await step('other belts are fitted, their label read and photographed', [phone], async () => {
    const card = page.getByRole('region', { name: LABELS })
    await card.getByLabel('FIA: not valid after').fill(String(new Date().getFullYear() + 2))
    await card.getByText('As declared: would be passed.').waitFor()
    await card.locator('input[type=file]').first().setInputFiles({ name: 'label.jpg', mimeType: 'image/jpeg', buffer: await aPhotograph() }) // prettier-ignore
    await card.getByRole('button', { name: /^Photograph: / }).waitFor()
    await page.getByRole('button', { name: 'White full face' }).click()
    const rear = page.getByRole('region', { name: 'Tread deep enough where it is least' }).getByRole('group', { name: 'Rear left' })
    await rear.getByLabel('Least of nine, mm').fill('5,5')
    await page.getByText(/^Saved at \d\d:\d\d/).waitFor()
  })

  await step('the page is closed and opened again: it comes back as it was', [phone], async () => {
    await page.reload()
    const card = page.getByRole('region', { name: LABELS })
    await card.getByText('As declared: would be passed.').waitFor()
    await card.getByRole('button', { name: /^Photograph: / }).waitFor()
    await page.getByText('Otherwise than last time: harness labels.').waitFor()
  })

  await step('it is signed, and passes nothing', [phone], async () => {
    await page.getByRole('button', { name: 'Sign the declaration' }).click()
    await page.getByText('Tick that you agree before you sign.').waitFor()
    await page.getByLabel('I agree.').check()
    await page.getByRole('button', { name: 'Sign the declaration' }).click()
    await page.getByText('Signed by Jory Tamsin').waitFor()
    await page.getByText('Declared in part').waitFor()
    expect(await page.getByText('would not be passed').count()).toBe(0)
    expect(await page.getByText('Nothing is passed yet').count()).toBe(1)
  })
  expect(phone.complaints()).toEqual([])

  const bay = watchPage(await (await browser.newContext({ viewport: PHONE })).newPage(), 'bay')
  await step('the bay sees the declared facts, values and photograph beside the check, and nothing is filled in', [bay], async () => {
    const as = { email: 'scrutineer@marram.example', password: seeded.password, post: 'bay', device: 'tablet 1' } as const
    await becomeCrewDevice(bay.page, seeded.server.origin, as)
    await findCar(bay.page, '303')
    expect(await bay.page.getByRole('radio', { name: 'Harness', exact: true }).isChecked()).toBe(true)
    await present(bay.page, { breather: 'as-made', coolers: 'as-made' })
    await bay.page.getByRole('button', { name: /^Go on: Cabin/ }).click()
    await bay.page.getByRole('list', { name: 'Checks at Cabin' }).getByRole('button', { name: 'harness labels' }).click()
    await bay.page.getByText(/^Declared: FIA 8853-2016, \d{4}/).waitFor()
    await bay.page.getByRole('button', { name: 'Photograph: harness labels, as declared' }).waitFor()
    expect(await bay.page.getByRole('combobox', { name: 'Standard on the label' }).inputValue()).toBe('')
  })
  expect(bay.complaints()).toEqual([])
})

test('who has not declared, and what would not be passed, stands on the organiser’s page', async () => {
  const office = watchPage(await (await browser.newContext({ viewport: { width: 1280, height: 900 } })).newPage(), 'office')
  const organiser = { email: 'organiser@marram.example', password: seeded.password }
  await signInOn(office.page, seeded.server.origin, organiser, `/events/${seeded.event}/entries`)

  await office.page.getByText('1 of 142 declared · 0 would not be passed').waitFor()
  expect(office.complaints()).toEqual([])
})

/** As the organiser's mail brings it: the row holds the hash alone. */
function aLink(): string {
  const token = randomBytes(32).toString('base64url')
  const database = new Database(seeded.server.db)
  const one = database
    .prepare<[], { club: string; entry: string; person: string }>(
      `SELECT e.club_id club, e.id entry, ep.person_id person FROM entry e JOIN entry_person ep ON ep.entry_id = e.id WHERE e.number = '303'`,
    )
    .get()
  database
    .prepare('INSERT INTO entry_link (token_hash, club_id, entry_id, person_id, created_at, expires_at) VALUES (?, ?, ?, ?, ?, ?)')
    .run(createHash('sha256').update(token).digest('hex'), one?.club, one?.entry, one?.person, Date.now(), Date.now() + 86_400_000)
  database.close()
  return token
}

function aPhotograph(): Promise<Buffer> {
  return sharp({ create: { width: 900, height: 600, channels: 3, background: { r: 180, g: 160, b: 60 } } }).jpeg().toBuffer() // prettier-ignore
}
