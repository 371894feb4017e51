import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { launchBrowser } from '../support/browser'
import { startServer } from '../support/server-process'
import { countNetworkBytes, type NetworkBytes } from './network-bytes'
import { row } from './row'
import { seedBenchDatabase } from './seed-bench-database'

const AIM_KB = 220

const folder = mkdtempSync(join(tmpdir(), 'lockwire-bench-'))
const db = join(folder, 'bytes.db')
seedBenchDatabase(db)
const server = await startServer({ db, env: { LOCKWIRE_LOG: 'error' } })
const browser = await launchBrowser()
try {
  const bay = await load(browser, '/bay')
  row({
    what: '/bay, cold, until its first screen stands',
    value: kilobytes(bay.rest),
    aim: `≤ ${String(AIM_KB)} KB`,
    met: bay.rest <= AIM_KB * 1000,
  })
  row({ what: '  of it, by kind', value: kinds(bay) })
  const pitExit = await load(browser, '/pit-exit')
  row({ what: '/pit-exit, cold, until its first screen stands', value: kilobytes(pitExit.rest) })
  row({ what: '  of it, by kind', value: kinds(pitExit) })
} finally {
  await browser.close()
  await server.stop()
  rmSync(folder, { recursive: true, force: true })
}

/** Without the worker, which would load all its shells beside the page and blur whose bytes they are. */
async function load(chromium: Browser, path: string): Promise<NetworkBytes> {
  const context = await chromium.newContext({ serviceWorkers: 'block', viewport: { width: 390, height: 844 } })
  const page: Page = await context.newPage()
  const read = await countNetworkBytes(page)
  await page.goto(`${server.origin}${path}`)
  await page.locator('main, [role=main]').first().waitFor()
  await page.waitForLoadState('networkidle')
  const bytes = read()
  await context.close()
  return bytes
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
