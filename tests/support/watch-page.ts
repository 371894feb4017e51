import { mkdirSync } from 'node:fs'
import { join, resolve } from 'node:path'
import type { Page } from 'playwright-core'

const PICTURES = resolve(import.meta.dirname, '../../.test/e2e')

/** What Chromium writes on the console when a request finds no network or no server, or the answer was cut. */
const CUT_OFF = /^Failed to load resource: net::ERR_(INTERNET_DISCONNECTED|CONNECTION_REFUSED|CONNECTION_RESET|EMPTY_RESPONSE|NETWORK_CHANGED|INCOMPLETE_CHUNKED_ENCODING|FAILED)/ // prettier-ignore

export interface WatchedPage {
  readonly page: Page
  readonly name: string
  /** From now on the network is (or is no longer) expected to fail. */
  readonly expectCutOff: (isCutOff: boolean) => void
  /** Errors and warnings of the console, breaches of the policy, and what was thrown, less failed requests while they were expected. */
  readonly complaints: () => readonly string[]
}

/** Listens to a page from its first moment: nothing it complains of goes unheard. */
export function watchPage(page: Page, name: string): WatchedPage {
  const said: string[] = []
  let isCutOff = false
  page.setDefaultTimeout(20_000)
  page.on('console', (message) => {
    if (message.type() !== 'error' && message.type() !== 'warning') return
    if (isCutOff && CUT_OFF.test(message.text())) return
    said.push(`${message.type()}: ${message.text()} (${message.location().url})`)
  })
  page.on('pageerror', (error) => said.push(`thrown: ${error.stack ?? error.message}`))
  return { page, name, expectCutOff: (value) => (isCutOff = value), complaints: () => said }
}

/** Does one step; where it fails, the error says what stood on each screen and where its picture is. */
export async function step<T>(title: string, watched: readonly WatchedPage[], work: () => Promise<T>): Promise<T> {
  try {
    return await work()
  } catch (error) {
    const seen = await Promise.all(watched.map((one) => describe(title, one)))
    throw new Error(`${title}: ${error instanceof Error ? error.message : String(error)}\n\n${seen.join('\n\n')}`, { cause: error })
  }
}

async function describe(title: string, { page, name, complaints }: WatchedPage): Promise<string> {
  if (page.isClosed()) return `── ${name}: closed`
  mkdirSync(PICTURES, { recursive: true })
  const file = join(PICTURES, `${title} ${name}`.replace(/[^a-z0-9]+/gi, '-').toLowerCase() + '.png')
  const picture = await page.screenshot({ path: file, fullPage: true }).then(
    () => file,
    (error: unknown) => `none: ${String(error)}`,
  )
  const words = await page.evaluate(() => document.body.innerText).catch((error: unknown) => String(error))
  return `── ${name} at ${page.url()} (picture: ${picture})\n${words}\n── its console: ${complaints().join('\n') || 'nothing'}`
}
