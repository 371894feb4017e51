import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { axeFindings } from '../support/axe'
import { launchBrowser } from '../support/browser'
import { type RunningServer, startServer } from '../support/server-process'

let browser: Browser
let server: RunningServer
const folder = mkdtempSync(join(tmpdir(), 'lockwire-shells-'))

beforeAll(async () => {
  browser = await launchBrowser()
  server = await startServer({ db: join(folder, 'lockwire.db') })
})

afterAll(async () => {
  await browser.close()
  await server.kill()
  rmSync(folder, { recursive: true, force: true })
})

test('the crew’s shells open with the network off and the server gone, and break no policy', async () => {
  const context = await browser.newContext()
  const page = await context.newPage()
  const complaints = complaintsOf(page)
  await page.goto(`${server.origin}/bay`)
  await page.evaluate(() => navigator.serviceWorker.ready)
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null)

  await server.kill()
  await context.setOffline(true)
  const answers: (readonly [string, number | undefined, boolean | undefined])[] = []
  for (const path of ['/bay', '/bay/somewhere/deep', '/pit-exit', '/sign-on', '/sign-on/briefing']) {
    const answer = await page.goto(server.origin + path)
    await page.waitForFunction(() => document.querySelector('main') !== null)
    answers.push([path, answer?.status(), answer?.fromServiceWorker()])
    expect(answer?.headers()['content-security-policy']).toContain("'wasm-unsafe-eval'")
    expect(new URL(page.url()).pathname).toBe(path)
  }
  const elsewhere = await page.goto(`${server.origin}/events/of-somebody`)
  const words = await page.getByRole('heading', { level: 1 }).innerText()
  server = await server.restart()

  expect(answers).toEqual([
    ['/bay', 200, true],
    ['/bay/somewhere/deep', 200, true],
    ['/pit-exit', 200, true],
    ['/sign-on', 200, true],
    ['/sign-on/briefing', 200, true],
  ])
  expect(elsewhere?.fromServiceWorker()).toBe(true)
  expect(words).toBe('This page needs the network')
  expect(complaints().filter((text) => /Content Security Policy|Refused to/.test(text))).toEqual([])
  await context.close()
})

test('the worker keeps the build’s own files and the shells, nothing of anybody and nothing of the interface', async () => {
  const context = await browser.newContext()
  const page = await context.newPage()
  await page.goto(`${server.origin}/bay`)
  await page.evaluate(() => navigator.serviceWorker.ready)
  for (const path of ['/', '/sign-in', '/design']) await page.goto(server.origin + path)
  await page.evaluate(() => fetch('/api/me').then((answer) => answer.text()))

  const kept = await page.evaluate(async () => {
    const all = await Promise.all((await caches.keys()).map(async (name) => (await caches.open(name)).keys()))
    return all.flat().map(({ url }) => new URL(url).pathname)
  })

  const pages = kept.filter((path) => !/^\/(_next\/static|icons|wasm)\//.test(path)).sort()
  expect(pages).toEqual(['/bay', '/offline', '/pit-exit', '/sign-on', '/theme.js'])
  expect(kept).toContain('/wasm/zxing_reader.wasm')
  await context.close()
})

test.each(['sun', 'night'] as const)(
  'axe finds nothing on the page of all primitives in %s, and nothing is wider than a phone',
  async (theme) => {
    const context = await browser.newContext({ viewport: { width: 360, height: 800 } })
    const page = await context.newPage()
    const complaints = complaintsOf(page)
    await page.addInitScript((chosen) => localStorage.setItem('lockwire.theme', chosen), theme)

    await page.goto(`${server.origin}/design`)
    await page.evaluate(() => document.fonts.ready)

    expect(await page.evaluate(() => document.documentElement.dataset.theme ?? 'sun')).toBe(theme)
    expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBeLessThanOrEqual(0)
    expect(await axeFindings(page)).toEqual([])
    expect(complaints()).toEqual([])
    await context.close()
  },
)

/** What the page said on its console as a warning or an error, and what it threw. */
function complaintsOf(page: Page): () => readonly string[] {
  const said: string[] = []
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') said.push(message.text())
  })
  page.on('pageerror', (error) => said.push(error.message))
  return () => said
}
