import Database from 'better-sqlite3'
import { join } from 'node:path'
import type { Browser, BrowserContext } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { advises, fails, findCar, present, putsRight, takesOne, walkOn, type Stop } from '../support/bay-walk'
import { launchBrowser } from '../support/browser'
import { becomeCrewDevice, signInOn, unsentOnStrip, waitForOfflineShells } from '../support/crew-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import type { RunningServer } from '../support/server-process'
import { step, watchPage, type WatchedPage } from '../support/watch-page'
import { zbarimg } from '../support/zbarimg'

const YEAR = new Date().getUTCFullYear()
const yy = (year: number) => String(year % 100).padStart(2, '0')

/** A standard road car. */
const ROAD_CAR = { belts: 'standard', roof: 'closed', tyres: 'road', passengerSeat: 'not', spacers: false, cooling: 'water', coolers: 'as-made', breather: 'as-made' } // prettier-ignore
const HARNESS_CAR = { ...ROAD_CAR, belts: 'harness', headRestraint: false, shoulderAnchor: 'bolted' }
const GOOD = {
  leastMm: '5.5',
  innerEdgeMm: '5.0',
  dateCode: `01${yy(YEAR - 2)}`,
  leakClass: 'dry',
  standard: 'fia-8853-2016',
  labelYear: String(YEAR + 2),
  labelsComplete: 'yes',
  labelsSameNumber: 'yes',
}
const GOOD_HELMET = { label: 'fia-8859-2015', secondLabel: 'none', face: 'full', madeYear: String(YEAR - 2), impact: 'no' }

const A = { number: '263', plate: 'AH99 DSX', driver: 'Idris Falkner', group: 'Advanced', car: 'Oriel GT4 twin', colour: 'orange' }
const B = { number: '323', plate: 'NH84 LGE', group: 'Novice' }
const C = { number: '232', plate: 'GF90 VGN', group: 'Intermediate' }

let seeded: SeededServer
let server: RunningServer
let browser: Browser
const contexts: BrowserContext[] = []

beforeAll(async () => {
  seeded = await startSeededServer('all-the-way')
  server = seeded.server
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
  await seeded.end(server)
})

async function open(name: string, options: Parameters<Browser['newContext']>[0]): Promise<WatchedPage> {
  const context = await browser.newContext(options)
  contexts.push(context)
  return watchPage(await context.newPage(), name)
}

test('[P1 P6] a car goes all the way: walked and passed with no network and no server, sent, printed, scanned, held, seen again', async () => {
  const bay = await open('bay', { viewport: { width: 390, height: 844 }, deviceScaleFactor: 2 })
  const { page } = bay
  const devices = [bay]
  let made = 0
  const onBay = <T>(title: string, work: () => Promise<T>) => step(title, devices, work)

  await onBay('the bay loads the day', async () => {
    await becomeCrewDevice(page, server.origin, {
      email: 'scrutineer@marram.example',
      password: seeded.password,
      post: 'bay',
      device: 'tablet, lane 1',
    })
    await page.getByText('142 entries are loaded').waitFor()
    await waitForOfflineShells(page)
  })

  bay.expectCutOff(true)
  await server.kill()
  await page.context().setOffline(true)

  await onBay('A is walked and passed', async () => {
    await findCar(page, A.number)
    made += await present(page, ROAD_CAR)
    made += (await walkOn(page, GOOD)).records
    await verdictIs(bay, 'passed')
  })

  await onBay('B is walked: an old tyre, a slack nut put right, the nuts asked again', async () => {
    await findCar(page, B.number)
    made += await present(page, ROAD_CAR)
    const walked = await walkOn(page, GOOD, {
      'front-left/wheels.nuts': putsRight('loose'),
      'front-left/rest': takesOne('wheels.clearance', putsRight('arch')),
      'rear-right/tyres.date-code': advises('old', { dateCode: `01${yy(YEAR - 7)}` }),
    })
    made += walked.records
    expect(timesAt(walked.stops, 'front-left/wheels.nuts').map(({ heading }) => heading.includes('see again'))).toEqual([false, true])
    await verdictIs(bay, 'passed with advisories')
  })

  await onBay('C is walked: shoulder straps at 50.2°', async () => {
    await findCar(page, C.number)
    made += await present(page, HARNESS_CAR)
    const steep = fails('steep', { runMm: '250', dropMm: '300' }, async () => {
      const words = page.getByRole('status').filter({ hasText: '50.2°' })
      expect(await words.innerText()).toContain('50.2° is 5.2° over the limit of 45°.')
      expect(await page.getByRole('button', { name: 'Seen so' }).isDisabled()).toBe(true)
    })
    made += (await walkOn(page, GOOD, { 'cabin/harness.shoulder-angle': steep })).records
    await verdictIs(bay, 'not passed')
    expect(await page.getByRole('button', { name: /Issue the pass/ }).count()).toBe(0)
  })

  await onBay('the kit of A’s driver passes and the band is on', async () => {
    await findCar(page, A.number)
    await page.getByRole('button', { name: `Helmet & kit: ${A.driver}` }).click()
    made += await present(page, { openCar: false, headRestraintWorn: false })
    made += (await walkOn(page, GOOD_HELMET)).records
    await verdictIs(bay, 'passed')
    await page.getByLabel('Number on the band you put on').fill('417')
    await page.getByRole('button', { name: 'Band is on' }).click()
    await page.getByRole('region', { name: 'Band' }).getByText('Band 417').waitFor()
    made += 1
  })

  const code = await onBay('A’s pass is issued', async () => {
    await page.getByRole('button', { name: 'Car', exact: true }).click()
    await page.getByRole('button', { name: `Issue the pass for ${A.number}` }).click()
    made += 1
    return passCode(bay)
  })

  await onBay('the page is loaded again with no network and no server', async () => {
    expect(await unsentOnStrip(page)).toBe(made)
    const answer = await page.reload()
    expect(answer?.fromServiceWorker()).toBe(true)
    expect(await passCode(bay)).toBe(code)
    expect(await unsentOnStrip(page)).toBe(made)
  })

  server = await server.restart()
  const board = await open('board', { viewport: { width: 1440, height: 900 } })
  devices.push(board)
  await onBay('the board knows nothing yet', async () => {
    await signInOn(
      board.page,
      server.origin,
      { email: 'organiser@marram.example', password: seeded.password },
      `/events/${seeded.event}/board`,
    )
    for (const car of [A, B, C]) await boardLine(board, car, 'not presented')
  })

  await onBay('the network is back and everything is sent', async () => {
    await page.context().setOffline(false)
    await page.locator('[data-slot=strip]').filter({ hasText: 'all sent' }).waitFor()
    bay.expectCutOff(false)
  })

  const rows = logRows()
  expect(rows.map(({ seq }) => seq)).toEqual(Array.from({ length: made }, (_, index) => index + 1))
  expect(rows.map(({ device_seq: deviceSeq }) => deviceSeq)).toEqual(Array.from({ length: made }, (_, index) => index + 1))
  expect(new Set(rows.map(({ disposition, code: why }) => `${disposition} ${why ?? ''}`))).toEqual(new Set(['accepted ']))
  expect(rows.filter(({ kind }) => kind === 'pass')).toHaveLength(1)
  expect(rows.filter(({ kind }) => kind === 'band')).toHaveLength(1)

  await onBay('the board shows them without being asked', async () => {
    await boardLine(board, A, 'passed')
    await boardLine(board, B, 'passed with advisories')
    await boardLine(board, C, 'not passed')
  })

  await onBay('zbarimg reads the printed label', async () => {
    const label = await printedLabel(bay)
    const token = (rows.find(({ kind }) => kind === 'pass') as LogRow).payload.token as string
    expect(zbarimg(label)).toEqual([`${server.origin}/p/${token}`.toUpperCase()])
  })

  for (const device of devices) expect(device.complaints(), device.name).toEqual([])
})

function timesAt(stops: readonly Stop[], at: string): readonly Stop[] {
  return stops.filter((stop) => stop.at === at)
}

/** On the page of all places. */
async function verdictIs({ page }: WatchedPage, verdict: string): Promise<void> {
  await page.getByRole('navigation', { name: 'Places' }).waitFor()
  await page
    .getByRole('status')
    .filter({ hasText: new RegExp(`^${verdict}$`) })
    .waitFor()
}

/** The typed code of the pass on the screen. */
async function passCode({ page }: WatchedPage): Promise<string> {
  const pass = page.getByRole('region', { name: 'Pass' })
  await pass.getByRole('img', { name: /^Code of the pass for / }).waitFor()
  return pass.locator('.pass-label-typed').innerText()
}

async function boardLine(
  { page }: WatchedPage,
  { plate, group }: { readonly plate: string; readonly group: string },
  verdict: string,
): Promise<void> {
  const line = page.getByRole('region', { name: group, exact: true }).getByRole('listitem').filter({ hasText: plate })
  await line.getByText(new RegExp(`^${verdict}(, \\d+ to see)?$`)).waitFor()
}

/** The first of the two labels as paper would have it, as a picture file. */
async function printedLabel({ page }: WatchedPage): Promise<string> {
  const file = join(seeded.folder, 'label.png')
  await page.emulateMedia({ media: 'print' })
  await page.locator('.print-only [data-slot=pass-label]').first().screenshot({ path: file })
  await page.emulateMedia({ media: null })
  return file
}

interface LogRow {
  readonly seq: number
  readonly device_seq: number
  readonly kind: string
  readonly disposition: string
  readonly code: string | null
  readonly jws: string
  readonly payload: Readonly<Record<string, unknown>>
}

/** The log as it lies in the database file, past the server. */
function logRows(): readonly LogRow[] {
  const database = new Database(server.db, { readonly: true })
  const rows = database.prepare<[], LogRow>('SELECT seq, device_seq, kind, disposition, code, jws FROM record ORDER BY seq').all()
  database.close()
  return rows.map((row) => ({ ...row, payload: JSON.parse(Buffer.from(row.jws.split('.')[1] ?? '', 'base64url').toString()) }))
}
