import type { Page } from 'playwright-core'

/** Says which group is on track now. */
export async function sayRunning(page: Page, group: string): Promise<void> {
  await page.getByRole('button', { name: 'Which group is running?' }).click()
  await page.getByRole('dialog').getByRole('button', { name: group, exact: true }).click()
  await page.getByRole('button', { name: `${group} running` }).waitFor()
}

/** Waits until the answer on the screen is this word; gives all its words in reading order. */
export async function answered(page: Page, word: 'PASSED' | 'HOLD' | 'CHECK'): Promise<string> {
  const answer = page.locator('[data-slot=answer-screen]')
  await answer.getByText(word, { exact: true }).waitFor()
  return answer.innerText()
}

export async function nextCar(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Next car' }).click()
}

export async function askByCode(page: Page, code: string): Promise<void> {
  await page.getByRole('tab', { name: 'Code' }).click()
  await page.getByRole('textbox', { name: 'Code under the sticker' }).fill(code)
  await page.getByRole('button', { name: 'Ask' }).click()
}

/** Holds a car by its number, sticker taken off, for one of the reasons of the list. */
export async function holdByNumber(page: Page, number: string, reason: string): Promise<void> {
  await page.getByRole('textbox', { name: 'Number of the car' }).fill(number)
  await page.getByRole('button', { name: 'Hold it' }).click()
  const sheet = page.getByRole('dialog')
  await sheet.getByRole('radio', { name: 'taken off' }).check()
  await sheet.getByRole('button', { name: reason, exact: true }).click()
}

/** Lets exactly one pull through the closed network and closes it again. */
export async function pullOnce(page: Page): Promise<void> {
  const PULL = /\/api\/sync\/pull/
  const traffic = /\/api\//
  let pulls = 0
  await page.route(traffic, (route) => {
    if (PULL.test(route.request().url()) && pulls++ === 0) return route.continue()
    return route.abort('internetdisconnected')
  })
  const answer = page.waitForResponse(PULL)
  await page.context().setOffline(false)
  const failure = await (await answer).finished()
  await page.context().setOffline(true)
  await page.unroute(traffic)
  if (failure) throw failure
}
