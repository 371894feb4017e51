import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { launchBrowser } from '../support/browser'
import { enrolDevice, signInOn } from '../support/crew-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import { step, watchPage, type WatchedPage } from '../support/watch-page'

let seeded: SeededServer
let browser: Browser

beforeAll(async () => {
  seeded = await startSeededServer('join')
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
  await seeded.end(seeded.server)
})

test('[M4] somebody without an account joins by a code, waits, is accepted by name, and enrols this phone by that alone', async () => {
  const office = await open('office')
  const phone = await open('phone')
  const onBoth = <T>(title: string, work: () => Promise<T>) => step(title, [office, phone], work)

  const link = await onBoth('the organiser makes a join code', async () => {
    const organiser = { email: 'organiser@marram.example', password: seeded.password }
    await signInOn(office.page, seeded.server.origin, organiser, `/events/${seeded.event}/people`)
    await office.page.getByLabel('For the role').selectOption('scrutineer')
    await office.page.getByRole('button', { name: 'Make a join code' }).click()
    await office.page.getByRole('img', { name: 'Code to join as scrutineer' }).waitFor()
    return office.page.getByText(/\/join\/\S+$/).innerText()
  })

  await onBoth('the phone asks and waits', async () => {
    await phone.page.goto(link)
    await phone.page.getByLabel('Your name').fill('Wenna Dray')
    await phone.page.getByRole('button', { name: 'Ask to join' }).click()
    await phone.page.getByText('Wenna Dray is waiting to be accepted as scrutineer').waitFor()
  })

  await onBoth('nobody waiting can enrol', async () => {
    const bay = await phone.page.context().newPage()
    await bay.goto(`${seeded.server.origin}/bay`)
    await bay.getByLabel('Name of this device').fill('phone of Wenna')
    await bay.getByRole('button', { name: 'Enrol this device' }).click()
    await bay.getByText('The organiser has not accepted this person.').waitFor()
    expect(await bay.getByLabel('Choose six digits for this device').count()).toBe(0)
    await bay.close()
  })

  await onBoth('the organiser accepts by name', async () => {
    await office.page.getByRole('button', { name: 'Accept Wenna Dray' }).click()
    await office.page.getByRole('row', { name: /Wenna Dray scrutineer join code accepted/ }).waitFor()
    await phone.page.getByText('Wenna Dray is accepted as scrutineer').waitFor()
  })

  await onBoth('the phone enrols by its claim and loads the day', async () => {
    await phone.page.getByRole('link', { name: 'To the bay' }).click()
    await phone.page.getByText('Wenna Dray, scrutineer').waitFor()
    await enrolDevice(phone.page, 'phone of Wenna')
    await phone.page.getByText('142 entries are loaded').waitFor()
  })

  // Whoever has no sign-in is asked for one first: the browser writes that answer down, the page goes on by the claim.
  const notSignedIn = /status of 401 \(Unauthorized\) \(\S+\/api\/me\)$/
  expect(phone.complaints().filter((text) => !notSignedIn.test(text))).toEqual([])
  expect(office.complaints()).toEqual([])
})

async function open(name: string): Promise<WatchedPage> {
  return watchPage(await (await browser.newContext({ viewport: { width: 800, height: 900 } })).newPage(), name)
}
