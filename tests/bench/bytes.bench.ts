import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { BrowserContext, Page } from 'playwright-core'
import { toBuffer } from 'qrcode'
import { launchBrowser } from '../support/browser'
import { becomeCrewDevice, DEVICE_PIN, waitForOfflineShells } from '../support/crew-device'
import { fakeCameraFrom } from '../support/fake-camera'
import { startServer } from '../support/server-process'
import { countNetworkBytes, type NetworkBytes } from './network-bytes'
import { row } from './row'
import { seedBenchDatabase } from './seed-bench-database'

const AIM_KB = 220
const PASSWORD = 'ottermere-ring-demo'

const folder = mkdtempSync(join(tmpdir(), 'lockwire-bench-'))
const db = join(folder, 'bytes.db')
seedBenchDatabase(db)
// A link that is not ours: the first decoded frame is answered HOLD.
const film = join(folder, 'foreign.mjpeg')
await fakeCameraFrom(await toBuffer('HTTPS://ELSEWHERE.EXAMPLE/P/AAAA', { errorCorrectionLevel: 'Q', width: 600 }), { file: film })
const server = await startServer({ db, env: { LOCKWIRE_LOG: 'error' } })
const browser = await launchBrowser({ camera: film })
try {
  report('/bay, cold, until it may be used', await ofDevice('bay', 'scrutineer', bayIsUsable), true)
  report('/pit-exit, cold, until the first decoded frame', await ofDevice('pit-exit', 'marshal', firstFrameDecoded), false)
} finally {
  await browser.close()
  await server.stop()
  rmSync(folder, { recursive: true, force: true })
}

/** Bytes that a page of an enrolled device takes from an empty browser cache, without the worker, which would load all its shells beside the page and blur whose bytes they are. */
async function ofDevice(post: 'bay' | 'pit-exit', role: string, ready: (page: Page) => Promise<void>): Promise<NetworkBytes> {
  const context = await browser.newContext({ viewport: { width: 390, height: 844 } })
  const first = await context.newPage()
  await becomeCrewDevice(first, server.origin, { email: `${role}@marram.example`, password: PASSWORD, post, device: `bench ${post}` })
  await waitForOfflineShells(first)
  await first.close()
  const bytes = await cold(context, post, ready)
  await context.close()
  return bytes
}

async function cold(context: BrowserContext, post: string, ready: (page: Page) => Promise<void>): Promise<NetworkBytes> {
  const page = await context.newPage()
  const network = await context.newCDPSession(page)
  await network.send('Network.enable')
  await network.send('Network.clearBrowserCache')
  await network.send('Network.setBypassServiceWorker', { bypass: true })
  const read = await countNetworkBytes(page)
  await page.goto(`${server.origin}/${post}`)
  await unlock(page)
  await ready(page)
  return read()
}

async function unlock(page: Page): Promise<void> {
  const pin = page.getByLabel('Your six digits')
  await pin
    .or(page.getByRole('heading', { level: 1 }))
    .first()
    .waitFor()
  if (!(await pin.isVisible())) return
  await pin.fill(DEVICE_PIN)
  await page.getByRole('button', { name: 'Unlock' }).click()
}

async function bayIsUsable(page: Page): Promise<void> {
  await page.getByText(/entries are loaded/).waitFor()
}

async function firstFrameDecoded(page: Page): Promise<void> {
  await page.locator('[data-slot=answer-screen]').getByText('HOLD', { exact: true }).waitFor()
}

function report(what: string, bytes: NetworkBytes, hasAim: boolean): void {
  const code = bytes.rest - (bytes.byKind.font ?? 0)
  row({
    what: `${what}: HTML, CSS, JS, data (gzip)`,
    value: kilobytes(code),
    ...(hasAim ? { aim: `≤ ${String(AIM_KB)} KB`, met: code <= AIM_KB * 1000 } : {}),
  })
  row({ what: '  with the fonts', value: kilobytes(bytes.rest) })
  row({ what: '  the decoder’s wasm beside them', value: kilobytes(bytes.wasm) })
  row({ what: '  by kind', value: kinds(bytes) })
}

function kinds({ byKind }: NetworkBytes): string {
  return Object.entries(byKind)
    .sort(([, a], [, b]) => b - a)
    .map(([kind, bytes]) => `${kind} ${kilobytes(bytes)}`)
    .join(', ')
}

function kilobytes(bytes: number): string {
  return `${(bytes / 1000).toFixed(0)} KB`
}
