import Database from 'better-sqlite3'
import type { Browser, Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest'
import { hashJson } from '@/lib/checklist/hash'
import { newId } from '@/lib/platform/ids'
import { findCar } from '../support/bay-walk'
import { launchBrowser } from '../support/browser'
import { becomeCrewDevice, signInOn, waitForOfflineShells } from '../support/crew-device'
import { paddockChecklist } from '../support/paddock-book'
import { answered, nextCar } from '../support/pit-exit-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import { step, watchPage, type WatchedPage } from '../support/watch-page'

/** The small checklist of the tests, less its fit: this day is about holds, not about how long a walk is. */
const CHECKLIST = {
  ...paddockChecklist,
  stations: paddockChecklist.stations.filter(({ subject }) => subject !== 'fit'),
  places: paddockChecklist.places.filter(({ subject }) => subject !== 'fit'),
  checks: paddockChecklist.checks.filter(({ subject }) => subject !== 'fit'),
}
const CO_DRIVER = 'Oona Velde'

interface Car {
  readonly entry: string
  readonly number: string
  readonly driver: string
  readonly group: string
}

let seeded: SeededServer
let browsers: readonly Browser[] = []
let bay: WatchedPage
let pit: WatchedPage
let office: WatchedPage
let shared: Car
let recalled: Car
let slicks: Car
let accepted: Car

beforeAll(async () => {
  seeded = await startSeededServer('holds')
  ;[shared, recalled, slicks, accepted] = prepare() as [Car, Car, Car, Car]
  // Two browsers: devices that share no storage, as two phones do not.
  const [one, other] = [await launchBrowser(), await launchBrowser()]
  browsers = [one, other]
  bay = watchPage(await (await one.newContext({ viewport: { width: 390, height: 844 } })).newPage(), 'bay')
  pit = watchPage(await (await other.newContext({ viewport: { width: 390, height: 844 } })).newPage(), 'pit exit')
  office = watchPage(await (await other.newContext({ viewport: { width: 1440, height: 900 } })).newPage(), 'office')
})

afterAll(async () => {
  for (const browser of browsers) await browser.close()
  await seeded.end(seeded.server)
})

afterEach(() => {
  for (const { name, complaints } of [bay, pit, office]) expect(complaints(), `console of ${name}`).toEqual([])
})

// One day, told in order: each test goes on where the one before it ended.

test('the chief passes four cars, recalls one after session 1 and accepts a fail of another with conditions', async () => {
  const { page } = bay
  await onBoth('the chief’s own phone loads the day', async () => {
    await becomeCrewDevice(page, seeded.server.origin, { ...as('chief'), post: 'bay', device: 'the chief’s phone' })
  })
  for (const car of [shared, recalled, slicks, accepted]) {
    await onBoth(`car ${car.number} is passed`, async () => {
      await findCar(page, car.number)
      await present(page, car === slicks)
      await walk(page, car === accepted ? 'seat.mounts' : null)
      if (car === accepted) await accept(page)
      if (car === recalled) await recall(page)
      await page.getByRole('button', { name: `Issue the pass for ${car.number}` }).click()
      await page.getByRole('img', { name: /^Code of the pass for / }).waitFor()
    })
    await onBoth(`the drivers of ${car.number} get their bands`, async () => {
      for (const driver of car === shared ? [car.driver, CO_DRIVER] : [car.driver]) await band(page, driver)
    })
  }
  await sent(bay)
})

test('[P8] offline, holding one driver of a shared car lets the other drive; holding the car stops both', async () => {
  const { page } = pit
  await onBoth('the marshal loads the day and goes offline', async () => {
    await becomeCrewDevice(page, seeded.server.origin, { ...as('marshal'), post: 'pit-exit', device: 'pit-exit phone' })
    await waitForOfflineShells(page)
    pit.expectCutOff(true)
    await page.context().setOffline(true)
    await page.getByRole('button', { name: 'Which group is running?' }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'Pit lane open to all groups' }).click()
    const said = await ask(page, shared.number, 'PASSED')
    expect(said).toContain(shared.driver)
    expect(said).toContain(CO_DRIVER)
  })
  await onBoth('one driver is held: the other may drive', async () => {
    await holdShown(page, shared.number, 'Driving standard', CO_DRIVER)
    const said = await answered(page, 'CHECK')
    expect(said).toMatch(new RegExp(`May go: ${shared.driver}`))
    expect(said).toMatch(new RegExp(`${CO_DRIVER} \\(band \\d+\\) may not: band is dead: Driving standard`))
    await page.getByRole('button', { name: new RegExp(`^✓?${shared.driver}`) }).click()
    await page.getByRole('button', { name: 'That is all aboard' }).click()
    await answered(page, 'PASSED')
  })
  await onBoth('the one who is held sits in it: HOLD', async () => {
    await nextCar(page)
    await ask(page, shared.number, 'CHECK')
    await page.getByRole('button', { name: new RegExp(`^✓?${CO_DRIVER}`) }).click()
    await page.getByRole('button', { name: 'That is all aboard' }).click()
    await answered(page, 'HOLD')
  })
  await onBoth('the car is held, told by its looks: both are stopped', async () => {
    await nextCar(page)
    await holdByLooks(page, shared, 'Light contact, one corner')
    const said = await answered(page, 'HOLD')
    expect(said).toContain('Light contact, one corner')
    expect(said).toContain('by eye: suspension and steering')
    expect(said).not.toContain('may drive')
    await nextCar(page)
  })
})

test('[F13] offline, the marshal says that session 1 is over: the recall is due and the car HOLD at once', async () => {
  const { page } = pit
  await onBoth('before it is over the car may go', async () => {
    await ask(page, recalled.number, 'PASSED')
    await nextCar(page)
  })
  await onBoth('session 1 is over', async () => {
    await page.getByRole('button', { name: 'open to all groups' }).click()
    const sheet = page.getByRole('dialog')
    await sheet.getByRole('button', { name: `Session 1 of ${recalled.group} is over` }).click()
    await sheet.getByText(`Is session 1 of ${recalled.group} over?`).waitFor()
    await sheet.getByRole('button', { name: `Session 1 of ${recalled.group} is over` }).click()
    await sheet.getByRole('button', { name: `Session 2 of ${recalled.group} is over` }).waitFor()
    await page.keyboard.press('Escape')
    expect(await ask(page, recalled.number, 'HOLD')).toContain('recall due')
    await nextCar(page)
  })
})

test('[P3 F4] a car that runs by dispensation is CHECK with its conditions, never PASSED', async () => {
  const { page } = pit
  await onBoth('the conditions are shown', async () => {
    expect(await ask(page, accepted.number, 'CHECK')).toContain('Only with: three laps at a time')
    await nextCar(page)
  })
})

test('[F13] wet declared offline: the car on slicks is HOLD until it has been seen and has a new pass', async () => {
  const { page } = pit
  await onBoth('the car on slicks may go while it is dry', async () => {
    await ask(page, slicks.number, 'PASSED')
    await nextCar(page)
  })
  await onBoth('wet is declared at the pit exit', async () => {
    await page.getByRole('button', { name: 'open to all groups' }).click()
    const sheet = page.getByRole('dialog')
    await sheet.getByRole('button', { name: 'Wet is declared' }).click()
    await sheet.getByRole('button', { name: 'Wet is declared' }).click()
    await sheet.getByText(/^Wet since/).waitFor()
    await page.keyboard.press('Escape')
    expect(await ask(page, slicks.number, 'HOLD')).toContain('Wet declared')
    await nextCar(page)
    // It has nothing that is looked at for the wet: its conditions are all there is to say.
    await ask(page, accepted.number, 'CHECK')
    await nextCar(page)
    await page.getByText(/^WET · /).waitFor()
  })
  await onBoth('the network is back, and the bay sees it for the wet', async () => {
    await page.context().setOffline(false)
    await sent(pit)
    pit.expectCutOff(false)
    await findCar(bay.page, slicks.number)
    await bay.page.getByRole('region', { name: 'Held' }).getByText('Wet declared').waitFor()
    await walk(bay.page, null)
    await bay.page.getByRole('button', { name: `Issue the pass for ${slicks.number}` }).click()
    await bay.page.getByRole('img', { name: /^Code of the pass for / }).waitFor()
    await sent(bay)
    await page.getByRole('textbox', { name: 'Number of the car' }).waitFor()
    await expect.poll(() => askOnce(page, slicks.number), { timeout: 60_000, interval: 1_000 }).toContain('PASSED')
  })
})

test('the organiser’s list of holds names what stands, with people and reasons', async () => {
  const { page } = office
  await step('the list is opened', [office], async () => {
    await signInOn(page, seeded.server.origin, as('organiser'), `/events/${seeded.event}/holds`)
    const standing = page.getByRole('tabpanel', { name: /^Standing/ })
    await standing.getByText('Light contact, one corner').waitFor()
    const words = await standing.innerText()
    for (const line of [`Driving standard: ${CO_DRIVER}`, `Recall: to be shown after session 1 of ${recalled.group}`, 'Only with: three laps at a time', 'by Bram Coster', 'by Sella Warrick']) expect(words).toContain(line) // prettier-ignore
    await page.getByRole('tab', { name: /^Ended/ }).click()
    expect(await page.getByRole('tabpanel').innerText()).toContain('Wet declared')
  })
})

/** Gives the event the small checklist and a timetable far ahead, names a second driver for the first of four cars, and tells of them. */
function prepare(): readonly Car[] {
  const database = new Database(seeded.server.db)
  const event = database.prepare('SELECT * FROM event WHERE id = ?').get(seeded.event) as { club_id: string; first_day: string }
  const hash = hashJson(CHECKLIST)
  database.prepare('INSERT INTO checklist_text (hash, body) VALUES (?, ?)').run(hash, JSON.stringify(CHECKLIST))
  const rows = database
    .prepare(
      `SELECT e.id entry, e.number, e.group_id groupId, g.name "group", p.name driver FROM entry e JOIN run_group g ON g.id = e.group_id
       JOIN entry_person ep ON ep.entry_id = e.id JOIN person p ON p.id = ep.person_id
       WHERE e.event_id = ? AND (SELECT count(*) FROM entry_person WHERE entry_id = e.id) = 1
       AND (SELECT count(*) FROM entry_person WHERE person_id = p.id) = 1 ORDER BY e.code LIMIT 4`,
    )
    .all(seeded.event) as (Car & { readonly groupId: string })[]
  const coDriver = newId()
  database
    .prepare('INSERT INTO person (id, club_id, event_id, name) VALUES (?, ?, ?, ?)')
    .run(coDriver, event.club_id, seeded.event, CO_DRIVER)
  database
    .prepare(`INSERT INTO entry_person (club_id, entry_id, person_id, role) VALUES (?, ?, ?, 'driver')`)
    .run(event.club_id, rows[0]?.entry, coDriver)
  database.prepare('DELETE FROM timetable_block WHERE event_id = ?').run(seeded.event)
  const block = database.prepare(
    `INSERT INTO timetable_block (id, club_id, event_id, day, kind, group_id, session, starts_at, ends_at) VALUES (?, ?, ?, ?, 'session', ?, ?, ?, ?)`,
  )
  const soon = Date.now() + 3_600_000
  for (const group of new Set(rows.map(({ groupId }) => groupId)))
    for (const session of [1, 2])
      block.run(newId(), event.club_id, seeded.event, event.first_day, group, session, soon + session * 1_200_000, soon + session * 1_200_000 + 900_000) // prettier-ignore
  database.prepare('UPDATE event SET checklist_hash = ?, snapshot_version = snapshot_version + 1 WHERE id = ?').run(hash, seeded.event)
  database.close()
  return rows
}

function as(role: 'chief' | 'marshal' | 'organiser') {
  return { email: `${role}@marram.example`, password: seeded.password } as const
}

function onBoth<T>(title: string, work: () => Promise<T>): Promise<T> {
  return step(title, [bay, pit], work)
}

async function sent({ page }: WatchedPage): Promise<void> {
  await page.locator('[data-slot=strip]').filter({ hasText: 'all sent' }).waitFor()
}

async function present(page: Page, isOnSlicks: boolean): Promise<void> {
  await page.getByRole('group', { name: 'a cage is fitted' }).getByRole('radio', { name: 'no' }).check()
  await page
    .getByRole('group', { name: 'it runs slicks' })
    .getByRole('radio', { name: isOnSlicks ? 'yes' : 'no' })
    .check()
  await page.getByRole('button', { name: /^Begin/ }).click()
  await page.getByRole('navigation', { name: 'Places' }).waitFor()
}

/** Sees everything that is asked, but `failing`, until nothing is left to go on to. */
async function walk(page: Page, failing: string | null): Promise<void> {
  const goOn = page.getByRole('button', { name: /^Go on:/ })
  const seen = page.getByRole('button', { name: 'Seen so' })
  const rest = page.getByRole('button', { name: /seen, nothing found$/ })
  const depth = page.getByRole('textbox', { name: 'tread depth' })
  let left = failing
  for (let stops = 0; stops < 40; stops += 1) {
    await page
      .getByRole('navigation', { name: 'Places' })
      .or(page.getByRole('list', { name: /^Checks at / }))
      .waitFor()
    const before = await screenWords(page)
    if (await page.getByRole('navigation', { name: 'Places' }).isVisible()) {
      if (!(await goOn.isVisible())) return
      await goOn.click()
    } else {
      await seen.or(rest).first().waitFor()
      if (left !== null && (await rest.isVisible()) && (await page.getByRole('button', { name: `${left} in order` }).isVisible())) {
        await failOne(page, left)
        left = null
      } else if (await rest.isVisible()) await rest.click()
      else {
        if (await depth.isVisible()) await depth.fill('6')
        await seen.click()
      }
    }
    await expect.poll(() => screenWords(page), { timeout: 10_000 }).not.toBe(before)
  }
  throw new Error('the walk does not end')
}

/** Takes one of the rest by itself and says that it is not so. */
async function failOne(page: Page, check: string): Promise<void> {
  await page.getByRole('button', { name: `${check} in order` }).click()
  await page.getByRole('button', { name: 'Not so' }).click()
  const reasons = page.getByRole('dialog')
  await reasons.getByLabel(/In your own words/).fill('worn through')
  await reasons.getByRole('button', { name: 'anything else', exact: true }).click()
}

/** Where the walk stands: another text at each stop. By what is drawn, not by the address, which moves a moment earlier. */
function screenWords(page: Page): Promise<string> {
  return page.evaluate(() => {
    const words = (selector: string) => document.querySelector<HTMLElement>(selector)?.innerText ?? ''
    return [words('h2'), words('#check-prompt')].join('|')
  })
}

async function accept(page: Page): Promise<void> {
  await page.getByRole('button', { name: /^Accept it: / }).click()
  const sheet = page.getByRole('dialog')
  await sheet.getByLabel('Why it may run').fill('the maker’s part comes at noon')
  await sheet.getByLabel('Only with these conditions').fill('three laps at a time')
  await sheet.getByRole('radio', { name: 'the end of the event' }).check()
  await sheet.getByRole('button', { name: 'Accept it with these conditions' }).click()
  await page.getByText('Only with: three laps at a time').first().waitFor()
}

async function recall(page: Page): Promise<void> {
  await page.getByRole('button', { name: `Recall ${recalled.number}` }).click()
  const sheet = page.getByRole('dialog')
  await sheet.getByRole('radio', { name: `after session 1 of ${recalled.group}` }).check()
  await sheet.getByRole('checkbox', { name: 'Brakes' }).check()
  await sheet.getByRole('button', { name: 'Recall it' }).click()
  await page.getByRole('region', { name: 'To be shown again' }).waitFor()
}

let bands = 400

async function band(page: Page, driver: string): Promise<void> {
  await page.getByRole('button', { name: `Helmet & kit: ${driver}` }).click()
  await page.getByRole('button', { name: /^Begin/ }).click()
  await page.getByRole('navigation', { name: 'Places' }).waitFor()
  await walk(page, null)
  bands += 1
  await page.getByLabel('Number on the band you put on').fill(String(bands))
  await page.getByRole('button', { name: 'Band is on' }).click()
  await page.getByRole('region', { name: 'Band' }).getByText(`Band ${bands}`).waitFor()
  await page.getByRole('button', { name: 'Car', exact: true }).click()
}

async function ask(page: Page, number: string, word: 'PASSED' | 'HOLD' | 'CHECK'): Promise<string> {
  await page.getByRole('textbox', { name: 'Number of the car' }).fill(number)
  await page.getByRole('button', { name: 'Ask', exact: true }).click()
  return answered(page, word)
}

/** Asks, reads whatever is answered, and goes on to the next car. */
async function askOnce(page: Page, number: string): Promise<string> {
  await page.getByRole('textbox', { name: 'Number of the car' }).fill(number)
  await page.getByRole('button', { name: 'Ask', exact: true }).click()
  const said = await page.locator('[data-slot=answer-screen]').innerText()
  await nextCar(page)
  return said
}

/** Holds what the answer on the screen is about, and says whom of those named. */
async function holdShown(page: Page, number: string, reason: string, person: string): Promise<void> {
  await page.getByRole('button', { name: `Hold ${number}` }).click()
  const sheet = page.getByRole('dialog')
  await sheet.getByRole('button', { name: reason, exact: true }).click()
  await sheet.getByRole('button', { name: person, exact: true }).click()
}

async function holdByLooks(page: Page, car: Car, reason: string): Promise<void> {
  await page.getByRole('button', { name: 'Hold a car by its plate or looks' }).click()
  await page
    .getByRole('dialog')
    .getByLabel(/^Plate, colour, model, driver/)
    .fill(`${car.driver.split(' ')[0] ?? ''} ${car.number}`)
  await page.getByRole('dialog').getByRole('listitem').getByRole('button').first().click()
  await page.getByRole('dialog').getByRole('button', { name: reason, exact: true }).click()
}
