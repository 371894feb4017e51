import Database from 'better-sqlite3'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { launchBrowser } from '../support/browser'
import { signInOn } from '../support/crew-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import { step, watchPage, type WatchedPage } from '../support/watch-page'

let seeded: SeededServer
let browser: Browser
let office: WatchedPage
let chief: WatchedPage

beforeAll(async () => {
  seeded = await startSeededServer('new-event')
  browser = await launchBrowser()
  office = watchPage(await (await browser.newContext({ viewport: { width: 1440, height: 900 } })).newPage(), 'office')
  chief = watchPage(await (await browser.newContext({ viewport: { width: 390, height: 844 } })).newPage(), 'chief')
})
afterAll(async () => {
  await browser.close()
  await seeded.end(seeded.server)
})

test('an event is made from nothing, its timetable typed, copied to the second day, and a fault is said beside its line', async () => {
  const { page } = office
  const day = (name: string) => page.getByRole('form', { name: `Timetable of ${name}` })
  await step('the event is made', [office], async () => {
    await signInOn(page, seeded.server.origin, { email: 'organiser@marram.example', password: seeded.password }, '/events')
    await page.getByRole('link', { name: 'New event' }).click()
    await page.getByRole('button', { name: 'Make the event' }).click()
    await page.getByText('a name such as “Marram in May”').waitFor()
    await page.getByLabel('Name').fill('Marram in May')
    await page.getByLabel('Venue').fill('Ottermere Ring')
    await page.getByLabel('First day').fill('2027-05-08')
    await page.getByLabel('Last day').fill('2027-05-09')
    await page.getByRole('button', { name: 'Make the event' }).click()
    await page.getByRole('heading', { level: 1, name: 'Marram in May' }).waitFor()
  })
  await step('the first day is typed', [office], async () => {
    const saturday = day('Sat 8 May 2027')
    for (let lines = 0; lines < 3; lines += 1) await saturday.getByRole('button', { name: 'Add a line' }).click()
    await saturday.getByLabel('From').nth(2).fill('09:30')
    await saturday.getByRole('button', { name: 'Save the day' }).click()
    await saturday.getByText('It begins while the session of 09:20 runs.').waitFor()
    await saturday.getByLabel('From').nth(2).fill('09:40')
    await saturday.getByRole('button', { name: 'Save the day' }).click()
    await saturday.getByText('Saved.', { exact: true }).waitFor()
  })
  await step('the second day is as the first', [office], async () => {
    const sunday = day('Sun 9 May 2027')
    await sunday.getByRole('button', { name: 'As on Sat 8 May 2027' }).click()
    await sunday.getByRole('button', { name: 'Save the day' }).click()
    await sunday.getByText('Saved.', { exact: true }).waitFor()
    await page.reload()
    expect(
      await day('Sun 9 May 2027')
        .getByLabel('From')
        .evaluateAll((fields) => fields.map((field) => (field as HTMLInputElement).value)),
    ).toEqual(['09:00', '09:20', '09:40'])
  })
  await step('a chief is invited', [office], async () => {
    await page.getByRole('link', { name: 'People' }).click()
    const invite = page.getByRole('form', { name: 'Invite by e-mail' })
    await invite.getByLabel('Name').fill('Sella Warrick')
    await invite.getByLabel('E-mail').fill('sella@example.org')
    await invite.getByLabel('Role').selectOption('chief')
    await invite.getByRole('button', { name: 'Invite' }).click()
    await invite.getByText('a mail with a link to choose a password is on its way').waitFor()
    await page.getByRole('cell', { name: 'chief' }).waitFor()
  })
  expect(office.complaints()).toEqual([])
})

test('the chief follows the link of the mail, chooses a password and comes in with it; the link opens nothing more', async () => {
  const { page } = chief
  const link = passwordLink()
  await step('a password is chosen', [chief], async () => {
    await page.goto(link)
    await page.getByLabel('New password').fill('seven drilled bolts')
    await page.getByRole('button', { name: 'Set it' }).click()
    await page.getByText('Your password is set.').waitFor()
    await signInOn(page, seeded.server.origin, { email: 'sella@example.org', password: 'seven drilled bolts' }, '/events')
    await page.getByRole('link', { name: /Marram in May/ }).waitFor()
    await page.goto(link)
    await page.getByText('This link has been used, or its seven days are over.').waitFor()
  })
  expect(chief.complaints()).toEqual([])
})

/** The link that the invitation carries, as it lies in the outbox. */
function passwordLink(): string {
  const database = new Database(seeded.server.db, { readonly: true })
  const row = database.prepare<[], { text: string }>("SELECT text FROM mail_outbox WHERE kind = 'crew-invitation'").get()
  database.close()
  const path = /\/password\/\S+/.exec(row?.text ?? '')?.[0]
  if (path === undefined) throw new Error('no invitation is in the outbox')
  return `${seeded.server.origin}${path}`
}
