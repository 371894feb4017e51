import type { Page } from 'playwright-core'

export interface EnrolledAs {
  readonly email: string
  readonly password: string
  readonly post: 'bay' | 'pit-exit' | 'sign-on'
  /** What the organiser sees as the device's name. */
  readonly device: string
}

export const DEVICE_PIN = '246813'

/** Signs in on the page for it and waits until the browser has gone where `path` leads. */
export async function signInOn(
  page: Page,
  origin: string,
  { email, password }: Pick<EnrolledAs, 'email' | 'password'>,
  path: string,
): Promise<void> {
  await page.goto(`${origin}/sign-in?next=${path}`)
  await page.getByLabel('E-mail').fill(email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL((url) => url.pathname === path)
}

/** Signs in, enrols this browser, sets six digits and loads the day: afterwards the first screen of the post stands there. */
export async function becomeCrewDevice(page: Page, origin: string, enrolled: EnrolledAs): Promise<void> {
  await signInOn(page, origin, enrolled, `/${enrolled.post}`)
  await enrolDevice(page, enrolled.device)
}

/** Enrols the browser whose enrolment page is open, sets six digits and loads the day. */
export async function enrolDevice(page: Page, device: string): Promise<void> {
  await page.getByLabel('Name of this device').fill(device)
  await page.getByRole('button', { name: 'Enrol this device' }).click()
  await page.getByLabel('Choose six digits for this device').fill(DEVICE_PIN)
  await page.getByRole('button', { name: 'Set them and go on' }).click()
  await page.getByRole('heading', { name: 'Ready offline' }).waitFor()
  await page.getByRole('button', { name: 'Begin' }).click()
}

/** Waits until the worker answers for this page and has kept the shells. */
export async function waitForOfflineShells(page: Page): Promise<void> {
  await page.evaluate(() => navigator.serviceWorker.ready)
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null)
  await page.waitForFunction(async () => {
    const kept = await Promise.all(['/bay', '/pit-exit', '/sign-on'].map((path) => caches.match(path, { ignoreVary: true })))
    return kept.every((answer) => answer !== undefined)
  })
}

/** What the device's own strip says that waits to be sent; 0 for “all sent”. */
export async function unsentOnStrip(page: Page): Promise<number> {
  const words = await page.locator('[data-slot=strip]').innerText()
  const found = /(\d+)(?: and \d+ photographs?)? to send/.exec(words)
  if (found) return Number(found[1])
  if (/all sent|photographs? to send/.test(words)) return 0
  throw new Error(`the strip does not say what waits to be sent: ${words}`)
}
