import Database from 'better-sqlite3'
import { renameSync } from 'node:fs'
import { join } from 'node:path'
import type { Browser } from 'playwright-core'
import { toBuffer } from 'qrcode'
import sharp from 'sharp'
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest'
import { advises, fails, findCar, present, putsRight, takesOne, walkOn } from '../support/bay-walk'
import { launchBrowser } from '../support/browser'
import { becomeCrewDevice, signInOn, unsentOnStrip, waitForOfflineShells } from '../support/crew-device'
import { fakeCameraFrom } from '../support/fake-camera'
import { answered, askByCode, holdByNumber, nextCar, pullOnce, sayRunning } from '../support/pit-exit-device'
import { type SeededServer, startSeededServer } from '../support/seeded-server'
import type { RunningServer } from '../support/server-process'
import { step, watchPage, type WatchedPage } from '../support/watch-page'
import { zbarimg } from '../support/zbarimg'

const YEAR = new Date().getUTCFullYear()
const yy = (year: number) => String(year % 100).padStart(2, '0')

/** A standard road car. */
const ROAD_CAR = { belts: 'standard', roof: 'closed', build: 'standard', tyres: 'road', passengerSeat: 'not', spacers: false, cooling: 'water', coolers: 'as-made', breather: 'as-made' } // prettier-ignore
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
let bay: WatchedPage
let board: WatchedPage
let marshal: (WatchedPage & { readonly browser: Browser }) | null = null
/** Records the bay has made so far. */
let made = 0

beforeAll(async () => {
  browser = await launchBrowser()
  seeded = await startSeededServer('all-the-way')
  server = seeded.server
  bay = await open(browser, 'bay', { viewport: { width: 390, height: 844 }, deviceScaleFactor: 2 })
  board = await open(browser, 'board', { viewport: { width: 1440, height: 900 } })
})

afterAll(async () => {
  await marshal?.browser.close()
  await browser.close()
  await seeded.end(server)
})

afterEach(() => {
  for (const device of [bay, board, ...(marshal ? [marshal] : [])])
    expect(device.complaints(), `console of ${device.name}: ${device.complaints().join(' | ')}`).toEqual([])
})

// The tests below are one day, told in order: each goes on where the one before it ended.

test('[M1 P1] the bay walks three cars and issues a pass with the network off and the server killed, and a reload keeps all of it', async () => {
  const { page } = bay
  await onBay('the bay loads the day', async () => {
    const as = { email: 'scrutineer@marram.example', password: seeded.password, post: 'bay', device: 'tablet, lane 1' } as const
    await becomeCrewDevice(page, server.origin, as)
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
    await verdictIs('passed')
  })
  await onBay('B is walked: an old tyre, a slack nut put right, the nuts asked again', walkB)
  await onBay('C is walked: shoulder straps at 50.2°', walkC)
  await onBay('the kit of A’s driver passes and the band is on', walkDriverOfA)
  const code = await onBay('A’s pass is issued', issuePass)

  await onBay('the page is loaded again with no network and no server', async () => {
    expect(await unsentOnStrip(page)).toBe(made)
    const answer = await page.reload()
    expect(answer?.fromServiceWorker()).toBe(true)
    expect(await passCode()).toBe(code)
    expect(await unsentOnStrip(page)).toBe(made)
  })
})

test('[S3 S7] the server returns: every record is there once, in order, accepted, and the board shows it without being asked', async () => {
  server = await server.restart()
  await step('the board knows nothing yet', [board], async () => {
    const organiser = { email: 'organiser@marram.example', password: seeded.password }
    await signInOn(board.page, server.origin, organiser, `/events/${seeded.event}/board`)
    for (const car of [A, B, C]) await boardSays(car, 'not presented')
  })

  await onBay('the network is back and everything is sent', async () => {
    await bay.page.context().setOffline(false)
    await everythingSent()
    bay.expectCutOff(false)
  })

  const rows = logRows()
  const upToMade = Array.from({ length: made }, (_, index) => index + 1)
  expect(rows.map(({ seq }) => seq)).toEqual(upToMade)
  expect(rows.map(({ device_seq: deviceSeq }) => deviceSeq)).toEqual(upToMade)
  expect(new Set(rows.map(({ id }) => id)).size).toBe(made)
  expect(rows.filter(({ disposition, code }) => disposition !== 'accepted' || code !== null)).toEqual([])
  expect(rows.filter(({ kind }) => kind === 'presented')).toHaveLength(4)
  expect(rows.filter(({ kind }) => kind === 'band')).toHaveLength(1)
  expect(rows.filter(({ kind }) => kind === 'pass')).toHaveLength(1)

  await step('the board shows them', [board], async () => {
    await boardSays(A, 'passed')
    await boardSays(B, 'passed with advisories')
    await boardSays(C, 'not passed')
  })
})

test('the label as it prints is read by a decoder that is not ours, and says the token of the record', async () => {
  const label = await onBay('the label is printed', () => printedLabel('first.png'))

  expect(zbarimg(label)).toEqual([stickerText(tokens()[0])])
})

test('[P1 P6 F7] an offline pit exit says PASSED for the label; after a hold and one pull HOLD; after a re-check the old one HOLD, the new one PASSED', async () => {
  const { page } = bay
  const first = join(seeded.folder, 'first.png')
  const film = join(seeded.folder, 'camera.mjpeg')
  await showToCamera(first, film)
  const ownBrowser = await launchBrowser({ camera: film })
  const pit = await open(ownBrowser, 'pit exit', { viewport: { width: 390, height: 844 } })
  marshal = { ...pit, browser: ownBrowser }
  const onBoth = <T>(title: string, work: () => Promise<T>) => step(title, [bay, pit], work)
  const codes = { first: await passCode(), second: '' }

  await onBoth('the marshal loads the day and goes offline', async () => {
    const as = { email: 'marshal@marram.example', password: seeded.password, post: 'pit-exit', device: 'pit-exit phone' } as const
    await becomeCrewDevice(pit.page, server.origin, as)
    await waitForOfflineShells(pit.page)
    pit.expectCutOff(true)
    await pit.page.context().setOffline(true)
    await pit.page.reload()
  })
  await onBoth('the label is PASSED', async () => {
    await answered(pit.page, 'CHECK')
    await nextCar(pit.page)
    await sayRunning(pit.page, A.group)
    await pit.page.reload()
    const said = await answered(pit.page, 'PASSED')
    for (const words of [A.number, '99DSX', A.colour, A.car, `${A.driver} (band 417) may drive`]) expect(said).toContain(words)
  })

  await onBoth('the bay holds A, and the pit exit cannot know', async () => {
    await page.goto(`${server.origin}/pit-exit`)
    await holdByNumber(page, A.number, 'Fluid dropped')
    await answered(page, 'HOLD')
    // The hold, and the recall after one more session that comes with this reason.
    made += 2
    await everythingSent()
    await answered(pit.page, 'PASSED')
  })
  await onBoth('after one pull the same sticker is HOLD', async () => {
    await pullOnce(pit.page)
    const said = await answered(pit.page, 'HOLD')
    expect(said).toContain('Fluid dropped')
    expect(said).not.toContain('may drive')
    await pit.page.reload()
    await answered(pit.page, 'HOLD')
  })

  await onBoth('what the hold names is seen again and a new pass issued', async () => {
    await page.goto(`${server.origin}/bay`)
    await findCar(page, A.number)
    await page.getByText('See again: Engine bay').waitFor()
    const { stops, records } = await walkOn(page, GOOD)
    made += records
    expect(stops.map(({ at }) => at)).toContain('rear-left/tyres.inner-edge')
    expect(stops.map(({ at }) => at)).not.toContain('rear-left/tyres.tread')
    await verdictIs('passed')
    codes.second = await issuePass()
    expect(codes.second).not.toBe(codes.first)
    await everythingSent()
    await showToCamera(await printedLabel('second.png'), film)
  })
  await onBoth('the old sticker is HOLD, the new one PASSED', async () => {
    await pullOnce(pit.page)
    // The old one still stands before the camera's last picture; its answer is another one now, and still no PASSED.
    expect(await answered(pit.page, 'HOLD')).not.toContain('Fluid dropped')
    await pit.page.reload()
    await answered(pit.page, 'PASSED')
    await nextCar(pit.page)
    await askByCode(pit.page, codes.first)
    await answered(pit.page, 'HOLD')
    await nextCar(pit.page)
    await askByCode(pit.page, codes.second)
    await answered(pit.page, 'PASSED')
    await showToCamera(first, film)
    await pit.page.reload()
    await answered(pit.page, 'HOLD')
  })

  expect(logRows().map(({ seq }) => seq)).toEqual(Array.from({ length: made }, (_, index) => index + 1))
  expect(tokens().map(stickerText)).toEqual(['first.png', 'second.png'].flatMap((name) => zbarimg(join(seeded.folder, name))))
})

test('a foreign code before the camera is HOLD, and is neither opened nor shown', async () => {
  const { page } = marshal as NonNullable<typeof marshal>
  const foreign = 'HTTPS://ELSEWHERE.EXAMPLE/P/LET-ME-OUT'
  const asked: string[] = []
  page.on('request', (request) => asked.push(request.url()))
  await fakeCameraFrom(await toBuffer(foreign, { errorCorrectionLevel: 'Q', width: 600 }), { file: join(seeded.folder, 'foreign.mjpeg') })
  renameSync(join(seeded.folder, 'foreign.mjpeg'), join(seeded.folder, 'camera.mjpeg'))

  const said = await step('the foreign code is scanned', [bay, marshal as WatchedPage], async () => {
    await page.reload()
    const words = await answered(page, 'HOLD')
    await page.getByText('a link that is not ours').waitFor()
    return words
  })

  expect(said.toUpperCase()).not.toContain('ELSEWHERE')
  expect(asked.filter((url) => new URL(url).host !== new URL(server.origin).host)).toEqual([])
  expect(page.url()).toBe(`${server.origin}/pit-exit`)
})

async function walkB(): Promise<void> {
  await findCar(bay.page, B.number)
  made += await present(bay.page, ROAD_CAR)
  const { stops, records } = await walkOn(bay.page, GOOD, {
    'front-left/wheels.nuts': putsRight('loose'),
    'front-left/rest': takesOne('wheels.clearance', putsRight('arch')),
    'rear-right/tyres.date-code': advises('old', { dateCode: `01${yy(YEAR - 7)}` }),
  })
  made += records
  const nuts = stops.filter(({ at }) => at === 'front-left/wheels.nuts')
  expect(nuts.map(({ heading }) => heading.includes('see again'))).toEqual([false, true])
  await verdictIs('passed with advisories')
}

async function walkC(): Promise<void> {
  await findCar(bay.page, C.number)
  made += await present(bay.page, HARNESS_CAR)
  const steep = fails('steep', { runMm: '250', dropMm: '300' }, async (page) => {
    await page.getByRole('status').getByText('50.2° is 5.2° over the limit of 45°.').waitFor()
    expect(await page.getByRole('button', { name: 'Seen so' }).isDisabled()).toBe(true)
  })
  made += (await walkOn(bay.page, GOOD, { 'cabin/harness.shoulder-angle': steep })).records
  await verdictIs('not passed')
  expect(await bay.page.getByRole('button', { name: /^Issue the pass/ }).count()).toBe(0)
}

async function walkDriverOfA(): Promise<void> {
  const { page } = bay
  await findCar(page, A.number)
  await page.getByRole('button', { name: `Helmet & kit: ${A.driver}` }).click()
  made += await present(page, { openCar: false, headRestraintWorn: false, minor: false })
  made += (await walkOn(page, GOOD_HELMET)).records
  await verdictIs('passed')
  await page.getByLabel('Number on the band you put on').fill('417')
  await page.getByRole('button', { name: 'Band is on' }).click()
  await page.getByRole('region', { name: 'Band' }).getByText('Band 417').waitFor()
  made += 1
  await page.getByRole('button', { name: 'Car', exact: true }).click()
}

/** Issues A's pass and gives its typed code. */
async function issuePass(): Promise<string> {
  await bay.page.getByRole('button', { name: `Issue the pass for ${A.number}` }).click()
  made += 1
  return passCode()
}

/** The typed code of the pass on the bay's screen. */
async function passCode(): Promise<string> {
  const pass = bay.page.getByRole('region', { name: 'Pass' })
  await pass.getByRole('img', { name: /^Code of the pass for / }).waitFor()
  return pass.locator('.pass-label-typed').innerText()
}

/** On the page of all places. */
async function verdictIs(verdict: string): Promise<void> {
  await bay.page.getByRole('navigation', { name: 'Places' }).waitFor()
  await bay.page
    .getByRole('status')
    .filter({ hasText: new RegExp(`^${verdict}$`) })
    .waitFor()
}

async function everythingSent(): Promise<void> {
  await bay.page.locator('[data-slot=strip]').filter({ hasText: 'all sent' }).waitFor()
}

async function boardSays({ plate, group }: { readonly plate: string; readonly group: string }, verdict: string): Promise<void> {
  const line = board.page.getByRole('region', { name: group, exact: true }).getByRole('listitem').filter({ hasText: plate })
  await line.getByText(new RegExp(`^${verdict}(, \\d+ to see)?$`)).waitFor()
}

/** The first of the two labels as paper would have it, as a picture file. */
async function printedLabel(name: string): Promise<string> {
  const { page } = bay
  const file = join(seeded.folder, name)
  await page.emulateMedia({ media: 'print' })
  await page.locator('.print-only [data-slot=pass-label]').first().screenshot({ path: file })
  await page.emulateMedia({ media: null })
  return file
}

/** Holds the left part of a printed label, where its code is, before the marshal's camera from its next opening on. */
async function showToCamera(label: string, file: string): Promise<void> {
  const { width, height } = await sharp(label).metadata()
  const code = await sharp(label)
    .extract({ left: 0, top: 0, width: Math.round(width / 2), height })
    .png()
    .toBuffer()
  // Put in its place in one go: the film that runs now is read as long as its camera is open.
  renameSync(await fakeCameraFrom(code, { file: join(seeded.folder, 'next.mjpeg') }), file)
}

function onBay<T>(title: string, work: () => Promise<T>): Promise<T> {
  return step(title, [bay], work)
}

async function open(at: Browser, name: string, options: Parameters<Browser['newContext']>[0]): Promise<WatchedPage> {
  return watchPage(await (await at.newContext(options)).newPage(), name)
}

interface LogRow {
  readonly seq: number
  readonly id: string
  readonly device_seq: number
  readonly kind: string
  readonly disposition: string
  readonly code: string | null
  readonly jws: string
}

/** The log as it lies in the database file, past the server. */
function logRows(): readonly LogRow[] {
  const database = new Database(server.db, { readonly: true })
  const rows = database.prepare<[], LogRow>('SELECT seq, id, device_seq, kind, disposition, code, jws FROM record ORDER BY seq').all()
  database.close()
  return rows
}

/** Tokens of the passes in the log, oldest first. */
function tokens(): readonly string[] {
  const passes = logRows().filter(({ kind }) => kind === 'pass')
  return passes.map(({ jws }) => {
    const payload = JSON.parse(Buffer.from(jws.split('.')[1] ?? '', 'base64url').toString()) as { readonly token: string }
    return payload.token
  })
}

/** What a sticker with this token says, written down here once more on purpose. */
function stickerText(token = ''): string {
  return `${server.origin}/p/${token}`.toUpperCase()
}
