import Database from 'better-sqlite3'
import type { Browser, Page } from 'playwright-core'
import sharp from 'sharp'
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest'
import { findCar, present } from '../support/bay-walk'
import { launchBrowser } from '../support/browser'
import { becomeCrewDevice, signInOn, waitForOfflineShells } from '../support/crew-device'
import { phonePhoto } from '../support/pictures'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import type { RunningServer } from '../support/server-process'
import { step, watchPage, type WatchedPage } from '../support/watch-page'

let seeded: SeededServer
let server: RunningServer
let browser: Browser
let bay: WatchedPage
let office: WatchedPage

beforeAll(async () => {
  browser = await launchBrowser()
  seeded = await startSeededServer('photos-and-mail')
  server = seeded.server
  bay = watchPage(await (await browser.newContext({ viewport: { width: 390, height: 844 }, deviceScaleFactor: 2 })).newPage(), 'bay')
  office = watchPage(await (await browser.newContext({ viewport: { width: 1440, height: 900 } })).newPage(), 'office')
})

afterAll(async () => {
  await browser.close()
  await seeded.end(server)
})

afterEach(() => {
  for (const device of [bay, office]) expect(device.complaints(), device.name).toEqual([])
})

test('[M1 S9] a fail with a photograph taken with no network and no server outlives a reload, and is served upright and without what the phone wrote into it', async () => {
  const { page } = bay
  const onBay = <T>(title: string, work: () => Promise<T>) => step(title, [bay], work)
  await onBay('the bay loads the day and a car is presented', async () => {
    const as = { email: 'scrutineer@marram.example', password: seeded.password, post: 'bay', device: 'tablet, lane 1' } as const
    await becomeCrewDevice(page, server.origin, as)
    await waitForOfflineShells(page)
    await findCar(page, '263')
    await present(page, { belts: 'standard', roof: 'closed', tyres: 'road' })
    await strip(page, /all sent/)
  })

  bay.expectCutOff(true)
  await server.kill()
  await page.context().setOffline(true)
  const short = await onBay('a fail is recorded with its photograph', async () => {
    await page.getByRole('button', { name: /^Go on:/ }).click()
    const photo = await phonePhoto({ width: 4000, height: 3000, orientation: 6 })
    await page.getByLabel('Photograph').setInputFiles({ name: 'IMG_4711.jpg', mimeType: 'image/jpeg', buffer: photo })
    const thumb = page.getByRole('button', { name: /^Photograph: / })
    await thumb.waitFor()
    const words = (await thumb.getAttribute('aria-label')) ?? ''
    await page.getByRole('button', { name: 'Not so' }).click()
    await page.getByRole('dialog').getByRole('button').first().click()
    await strip(page, /1 and 1 photograph to send/)
    return words.replace('Photograph: ', '')
  })

  await onBay('a reload has record and picture, still without a network', async () => {
    const answer = await page.reload()
    expect(answer?.fromServiceWorker()).toBe(true)
    await strip(page, /1 and 1 photograph to send/)
    await backAt(page, short)
    expect(await widthOf(page, `Photograph: ${short}, fail`)).toBeGreaterThan(0)
  })

  await onBay('the server returns and everything is sent', async () => {
    server = await server.restart()
    await page.context().setOffline(false)
    await strip(page, /all sent/)
    bay.expectCutOff(false)
  })

  const { hash, named } = whatTheServerHas()
  expect(named).toBe(true)
  await step('the organiser is served it', [office], async () => {
    const organiser = { email: 'organiser@marram.example', password: seeded.password }
    await signInOn(office.page, server.origin, organiser, `/events/${seeded.event}/mail`)
    const answer = await office.page.request.get(`${server.origin}/api/photos/${hash}`)
    expect([answer.status(), answer.headers()['content-type'], answer.headers()['x-content-type-options']]).toEqual([
      200,
      'image/jpeg',
      'nosniff',
    ])
    const bytes = await answer.body()
    const { width, height, exif } = await sharp(bytes).metadata()
    expect([width, height, exif]).toEqual([1200, 1600, undefined])
    expect(bytes.includes('CANARY')).toBe(false)
  })
  expect((await fetch(`${server.origin}/api/photos/${hash}`)).status).toBe(401)
})

test('everybody with an address is invited once, and the link in the inbox opens the entry', async () => {
  const { page } = office
  await step('the organiser invites', [office], async () => {
    await page.goto(`${server.origin}/events/${seeded.event}/mail`)
    await page.getByRole('button', { name: /^Invite all not invited: \d+ mails$/ }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'Send', exact: true }).click()
    await page.getByText('Everybody with an address is invited.').waitFor()
    await page.getByText(/Mail: \d+ sent, 0 waiting, 0 given up/).waitFor()
  })

  await step('the mail is in the inbox, and its link leads to the entry', [office], async () => {
    await page.goto(`${server.origin}/inbox`)
    await page.getByText('Nothing has left this machine.').waitFor()
    await page.locator('summary').first().click()
    const link = page.getByRole('link', { name: /\/entry\/[\w-]{43}$/ }).first()
    const href = (await link.getAttribute('href')) ?? ''
    const entrant = watchPage(await (await browser.newContext({ viewport: { width: 390, height: 844 } })).newPage(), 'entrant')
    const answer = await entrant.page.goto(href)
    expect(answer?.status()).toBe(200)
    await entrant.page.getByText('Ottermere Ring').first().waitFor()
    expect(entrant.complaints()).toEqual([])
  })
})

/** Waits until the device's own strip says so. */
async function strip(page: Page, says: RegExp): Promise<void> {
  await page.locator('[data-slot=strip]').filter({ hasText: says }).waitFor()
}

async function backAt(page: Page, short: string): Promise<void> {
  const checks = page.getByRole('list', { name: /^Checks at / })
  const goOn = page.getByRole('button', { name: /^Go on:/ })
  await checks.or(goOn).first().waitFor()
  if ((await checks.count()) === 0) await goOn.click()
  await checks.getByRole('button', { name: short }).first().click()
}

/** How wide a picture really is: 0 for one that could not be decoded. */
async function widthOf(page: Page, name: string): Promise<number> {
  const picture = page.getByRole('button', { name }).locator('img')
  await picture.waitFor()
  return picture.evaluate(async (image: HTMLImageElement) => {
    await image.decode()
    return image.naturalWidth
  })
}

/** The photograph's row, and whether a record names it. */
function whatTheServerHas(): { readonly hash: string; readonly named: boolean } {
  const database = new Database(server.db, { readonly: true })
  const { hash } = database.prepare('SELECT hash FROM photo WHERE event_id = ?').get(seeded.event) as { readonly hash: string }
  const rows = database.prepare('SELECT jws FROM record').all() as readonly { readonly jws: string }[]
  database.close()
  const payloads = rows.map(({ jws }) => Buffer.from(jws.split('.')[1] ?? '', 'base64url').toString())
  return { hash, named: payloads.some((payload) => payload.includes(hash)) }
}
