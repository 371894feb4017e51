import { resolve } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { axeFindings } from '../support/axe'
import { findCar, present } from '../support/bay-walk'
import { launchBrowser } from '../support/browser'
import { becomeCrewDevice, signInOn } from '../support/crew-device'
import { askByCode, answered } from '../support/pit-exit-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import { step, watchPage, type WatchedPage } from '../support/watch-page'

const THEMES = ['sun', 'night'] as const
type Theme = (typeof THEMES)[number]

let seeded: SeededServer
let browser: Browser

beforeAll(async () => {
  seeded = await startSeededServer('axe')
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
  await seeded.end(seeded.server)
})

test.each(THEMES)('axe finds nothing on the office’s pages in %s', async (theme) => {
  const office = await open(`office in ${theme}`, theme, { width: 1280, height: 900 })
  const { page } = office
  const at = `/events/${seeded.event}`
  const found = await step('the office is looked through', [office], async () => {
    await page.goto(`${seeded.server.origin}/sign-in`)
    const signIn = await lookAt(page, 'sign-in', theme, page.getByRole('button', { name: 'Sign in' }))
    await signInOn(page, seeded.server.origin, { email: 'organiser@marram.example', password: seeded.password }, `${at}/board`)
    const board = await lookAt(page, 'board', theme, page.getByRole('region', { name: 'Novice' }))
    await page.goto(`${seeded.server.origin}${at}/entries`)
    const entries = await lookAt(page, 'entries', theme, page.getByRole('table'))
    await page
      .getByRole('link', { name: /^Entry / })
      .first()
      .click()
    const entry = await lookAt(page, 'entry', theme, page.getByRole('heading', { name: 'What became of it' }))
    await page.goto(`${seeded.server.origin}${at}/holds`)
    const holds = await lookAt(page, 'holds', theme, page.getByText('Nothing is held'))
    await page.goto(`${seeded.server.origin}${at}/import`)
    const list = await lookAt(page, 'import', theme, page.getByText('No list chosen'))
    await page.getByLabel('Choose an entry list').setInputFiles(resolve(import.meta.dirname, '../fixtures/entries-messy.csv'))
    const asked = await lookAt(page, 'import, asked', theme, page.getByRole('heading', { name: /questions$/ }))
    await page.goto(`${seeded.server.origin}${at}/people`)
    const people = await lookAt(page, 'people', theme, page.getByRole('table'))
    await page.goto(`${seeded.server.origin}${at}/mail`)
    const mail = await lookAt(page, 'mail', theme, page.getByRole('heading', { name: 'Invitation' }))
    await page.goto(`${seeded.server.origin}/inbox`)
    const inbox = await lookAt(page, 'inbox', theme, page.getByRole('heading', { name: 'Inbox' }))
    await page.goto(`${seeded.server.origin}${at}/order`)
    const order = await lookAt(page, 'order', theme, page.getByRole('heading', { name: 'Call-up windows' }))
    await page.goto(`${seeded.server.origin}${at}/wall`)
    const wall = await lookAt(page, 'wall', theme, page.getByRole('heading', { name: /^Novice/ }))
    await page.goto(`${seeded.server.origin}${at}/timetable`)
    const timetable = await lookAt(page, 'timetable', theme, page.getByRole('button', { name: 'Save the day' }).first())
    await page.goto(`${seeded.server.origin}/events/new`)
    const fresh = await lookAt(page, 'new event', theme, page.getByRole('button', { name: 'Make the event' }))
    const day = [...board, ...holds, ...order, ...wall, ...timetable, ...fresh]
    return [...signIn, ...day, ...entries, ...entry, ...list, ...asked, ...people, ...mail, ...inbox]
  })

  expect(found).toEqual([])
  expect(office.complaints()).toEqual([])
})

test.each(THEMES)('axe finds nothing on the bay’s screens in %s, and nothing is wider than a phone', async (theme) => {
  const bay = await open(`bay in ${theme}`, theme, { width: 360, height: 800 })
  const { page } = bay
  const found = await step('the bay is looked through', [bay], async () => {
    const as = { email: 'scrutineer@marram.example', password: seeded.password, post: 'bay', device: `bay in ${theme}` } as const
    await becomeCrewDevice(page, seeded.server.origin, as)
    const find = await lookAt(page, 'find', theme, page.getByRole('heading', { name: 'Find a car' }))
    await findCar(page, theme === 'sun' ? '263' : '323')
    const facts = await lookAt(page, 'facts', theme, page.getByRole('button', { name: 'Begin the walk' }))
    await present(page, { belts: 'harness', headRestraint: false, roof: 'open' })
    const car = await lookAt(page, 'car', theme, page.getByRole('navigation', { name: 'Places' }))
    await page.getByRole('button', { name: /^Go on: Cabin/ }).click()
    const place = await lookAt(page, 'place', theme, page.getByRole('button', { name: 'Not so' }))
    await page.getByRole('list', { name: 'Checks at Cabin' }).getByRole('button', { name: 'shoulder angle' }).click()
    const measured = await lookAt(page, 'place, a measured check', theme, page.getByRole('button', { name: 'Next value' }))
    await page.getByRole('button', { name: 'Not so' }).click()
    const reasons = await lookAt(page, 'place, reasons', theme, page.getByRole('dialog'))
    return [...find, ...facts, ...car, ...place, ...measured, ...reasons]
  })

  expect(found).toEqual([])
  expect(bay.complaints()).toEqual([])
})

test.each(THEMES)('axe finds nothing at the pit exit in %s, and nothing is wider than a phone', async (theme) => {
  const pit = await open(`pit exit in ${theme}`, theme, { width: 360, height: 800 })
  const { page } = pit
  const found = await step('the pit exit is looked through', [pit], async () => {
    const as = { email: 'marshal@marram.example', password: seeded.password, post: 'pit-exit', device: `pit exit in ${theme}` } as const
    await becomeCrewDevice(page, seeded.server.origin, as)
    const number = await lookAt(page, 'pit exit', theme, page.getByRole('textbox', { name: 'Number of the car' }))
    await askByCode(page, '00000000')
    await answered(page, 'HOLD')
    const answer = await lookAt(page, 'answer', theme, page.getByRole('button', { name: 'Next car' }))
    return [...number, ...answer]
  })

  expect(found).toEqual([])
  expect(pit.complaints()).toEqual([])
})

test.each(THEMES)('axe finds nothing on the entrant’s pages in %s, and nothing is wider than a phone', async (theme) => {
  const entrant = await open(`entrant in ${theme}`, theme, { width: 360, height: 800 })
  const { page } = entrant
  const found = await step('the entrant’s pages are looked through', [entrant], async () => {
    await page.goto(`${seeded.server.origin}/entry/${'A'.repeat(43)}`)
    const link = await lookAt(page, 'link', theme, page.getByRole('alert'))
    await signInOn(page, seeded.server.origin, { email: 'entrant@marram.example', password: seeded.password }, '/cars')
    const cars = await lookAt(page, 'cars', theme, page.getByRole('button', { name: 'Add a car' }))
    await page.getByRole('link', { name: /RE41/ }).click()
    const car = await lookAt(page, 'car', theme, page.getByRole('button', { name: 'Keep it' }))
    await page.goto(`${seeded.server.origin}/kit`)
    await page.getByRole('button', { name: 'Change White full face' }).click()
    const kit = await lookAt(page, 'kit', theme, page.getByRole('button', { name: 'Put it away' }))
    await page.goto(`${seeded.server.origin}/cars`)
    await page.getByRole('link', { name: /303/ }).click()
    const entry = await lookAt(page, 'entry', theme, page.getByRole('heading', { name: 'Entry code' }))
    await page.getByRole('link', { name: 'Declare the car' }).click()
    const declaring = await lookAt(page, 'declaration', theme, page.getByText('As declared: would not be passed.'))
    return [...link, ...cars, ...car, ...kit, ...entry, ...declaring]
  })

  expect(found).toEqual([])
  expect(entrant.complaints()).toEqual([])
})

test.each(THEMES)('axe finds nothing at the sign-on desk in %s, and nothing is wider than a phone', async (theme) => {
  const desk = await open(`desk in ${theme}`, theme, { width: 360, height: 800 })
  const { page } = desk
  const found = await step('the desk is looked through', [desk], async () => {
    const as = { email: 'sign-on@marram.example', password: seeded.password, post: 'sign-on', device: `desk in ${theme}` } as const
    await becomeCrewDevice(page, seeded.server.origin, as)
    const home = await lookAt(page, 'sign-on', theme, page.getByRole('heading', { name: 'Still missing' }))
    await page.getByRole('button', { name: 'Who was at a briefing' }).click()
    const briefing = await lookAt(page, 'briefing', theme, page.getByRole('heading', { name: 'Who was at a briefing' }))
    await page.getByRole('button', { name: 'Back to sign-on' }).click()
    await page.getByRole('button', { name: 'Somebody turned up' }).click()
    const turnedUp = await lookAt(page, 'turned up', theme, page.getByRole('heading', { name: 'Somebody turned up' }))
    await page.getByRole('button', { name: 'Back to sign-on' }).click()
    await page.getByLabel('Name, car number or plate').fill('263')
    await page.keyboard.press('Enter')
    const person = await lookAt(page, 'person', theme, page.getByRole('button', { name: 'Begin' }))
    return [...home, ...briefing, ...turnedUp, ...person]
  })

  expect(found).toEqual([])
  expect(desk.complaints()).toEqual([])
})

test('axe would find something: a picture without words, put on the sign-in page', async () => {
  const { page } = await open('sign-in', 'sun', { width: 360, height: 800 })
  await page.goto(`${seeded.server.origin}/sign-in`)
  await isAlive(page)
  await page.evaluate(() => document.querySelector('main')?.append(document.createElement('img')))

  expect(await lookAt(page, 'sign-in', 'sun', page.getByRole('main'))).toEqual([expect.stringMatching(/^sign-in: image-alt: /)])
})

/** What is wrong with the page once `ready` stands on it, each with the page's name. */
async function lookAt(page: Page, name: string, theme: Theme, ready: ReturnType<Page['getByRole']>): Promise<readonly string[]> {
  await isAlive(page)
  await ready.first().waitFor()
  expect(await page.evaluate(() => document.documentElement.dataset.theme ?? 'sun')).toBe(theme)
  const tooWide = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)
  const findings = await axeFindings(page)
  return [...findings, ...(tooWide > 0 ? [`${tooWide} px wider than the screen`] : [])].map((finding) => `${name}: ${finding}`)
}

/** The worker is registered by an effect: from then on the page is what its scripts make of it. */
async function isAlive(page: Page): Promise<void> {
  await page.evaluate(() => navigator.serviceWorker.ready.then(() => document.fonts.ready))
}

async function open(name: string, theme: Theme, viewport: { readonly width: number; readonly height: number }): Promise<WatchedPage> {
  const context = await browser.newContext({ viewport })
  await context.addInitScript((chosen) => localStorage.setItem('lockwire.theme', chosen), theme)
  return watchPage(await context.newPage(), name)
}
