import { readFileSync } from 'node:fs'
import { resolve } from 'node:path'
import type { Locator, Page } from 'playwright-core'

interface Measure {
  readonly kind: 'number' | 'choice' | 'text'
  readonly id: string
  readonly label: string
  readonly options?: readonly { readonly id: string; readonly label: string }[]
}
interface Check {
  readonly id: string
  readonly prompt: string
  readonly measure?: readonly Measure[]
  readonly photo?: 'on-fail' | 'always'
  readonly reasons: readonly { readonly id: string; readonly text: string }[]
}
interface Fact {
  readonly name: string
  readonly label: string
  readonly values: readonly { readonly value: string | boolean; readonly label: string }[]
}
const checklist = JSON.parse(readFileSync(resolve(import.meta.dirname, '../../checklists/closed-circuit/v2.json'), 'utf8')) as {
  readonly facts: readonly Fact[]
  readonly checks: readonly Check[]
}

/** Values by measure id: figures and texts as keyed, choices by their id. */
export type Values = Readonly<Record<string, string>>

/** What is done at one stop of the walk; gives how many records it makes. */
export type Act = (page: Page, check: Check | null) => Promise<number>

/** One stop as it was met. */
export interface Stop {
  /** `front-left/wheels.nuts`, or `front-left/rest` for a place's closing sentence. */
  readonly at: string
  /** `Front left · 2 of 6 · no-go item · see again` */
  readonly heading: string
}

export interface Walked {
  readonly stops: readonly Stop[]
  /** Records made on the way. */
  readonly records: number
}

/** Finds a car as a scrutineer does: types its number and presses Enter. */
export async function findCar(page: Page, number: string): Promise<void> {
  const another = page.getByRole('button', { name: 'Another car' })
  if ((await another.count()) > 0) await another.click()
  await page.getByLabel('Number, plate or code on the sticker').fill(number)
  // The list is drawn a moment after the typing; before that Enter would open nothing.
  await page.getByRole('heading', { name: /^\d+ found$/ }).waitFor()
  await page.keyboard.press('Enter')
  await page.getByRole('heading', { level: 1, name: number, exact: true }).waitFor()
}

/** Answers what stands before the scrutineer and begins the walk. One record. */
export async function present(page: Page, facts: Readonly<Record<string, string | boolean>>): Promise<number> {
  for (const [name, value] of Object.entries(facts)) {
    const fact = named(checklist.facts, (one) => one.name === name, `fact ${name}`)
    const option = named(fact.values, (one) => one.value === value, `${name} = ${String(value)}`)
    const group = page.getByRole('group', { name: fact.label, exact: true })
    await group.getByRole('radio', { name: option.label, exact: true }).check()
  }
  await page.getByRole('button', { name: /^Begin/ }).click()
  await page.getByRole('navigation', { name: 'Places' }).waitFor()
  return 1
}

/**
 * Walks until nothing is left to answer. `values` are what is measured where nothing special is said; `special` is what is done at a stop
 * instead of seeing it so, once each.
 */
export async function walkOn(page: Page, values: Values, special: Readonly<Record<string, Act>> = {}): Promise<Walked> {
  const left = new Map(Object.entries(special))
  const stops: Stop[] = []
  let records = 0
  for (;;) {
    const stop = await whereIsIt(page)
    if (stop === null) {
      const goOn = page.getByRole('button', { name: /^Go on:/ })
      if ((await goOn.count()) === 0) break
      await moved(page, () => goOn.click())
      continue
    }
    stops.push(stop)
    if (stops.length > 200) throw new Error(`the walk does not end: ${stops.slice(-5).map(({ at }) => at).join(', ')}`) // prettier-ignore
    const act = left.get(stop.at) ?? (stop.at.endsWith('/rest') ? closes() : seen(values))
    left.delete(stop.at)
    records += await act(page, checkAt(stop))
  }
  if (left.size > 0)
    throw new Error(`the walk never came to ${[...left.keys()].join(', ')}; it came to ${stops.map(({ at }) => at).join(', ')}`)
  return { stops, records }
}

/** Sees it so, with the values measured. */
export function seen(values: Values): Act {
  return async (page, check) => {
    await measure(page, check, values)
    await moved(page, () => page.getByRole('button', { name: 'Seen so' }).click())
    return 1
  }
}

/** Lets it run with a note: by the rule's own word where it says so, by the scrutineer's where not. */
export function advises(reason: string, values: Values = {}): Act {
  return async (page, check) => {
    await measure(page, check, values)
    await page.getByRole('button', { name: /^(May run, with a note|Advisory)$/ }).first().click() // prettier-ignore
    await moved(page, () => giveReason(page, check, reason))
    return 1
  }
}

/** Says that it is not so. `look` sees the screen before that, values keyed. */
export function fails(reason: string, values: Values = {}, look: (page: Page) => Promise<void> = async () => undefined): Act {
  return async (page, check) => {
    await measure(page, check, values)
    await look(page)
    await page.getByRole('button', { name: 'Not so' }).click()
    await moved(page, async () => {
      await giveReason(page, check, reason)
      if (check?.photo !== undefined) await page.getByRole('button', { name: 'No photograph can be taken' }).click()
    })
    return 1
  }
}

/** Puts it right on the spot and sees it again: one action. */
export function putsRight(reason: string): Act {
  return async (page, check) => {
    await page.getByRole('button', { name: 'Put right here' }).click()
    await moved(page, () => giveReason(page, check, reason))
    return 1
  }
}

/** At a place's closing sentence: takes one of the rest by itself. */
export function takesOne(checkId: string, act: Act): Act {
  return async (page) => {
    const check = checkOf(checkId)
    const rest = page.getByRole('region', { name: 'The rest of this place' })
    await moved(page, () => rest.getByRole('button', { name: check.prompt }).click())
    return act(page, check)
  }
}

/** Closes a place with the one answer that names the rest; a record for each that was open. */
export function closes(): Act {
  return async (page) => {
    const rest = page.getByRole('region', { name: 'The rest of this place' })
    const sentence = rest.getByRole('button', { name: /seen, nothing found$/ })
    const words = await sentence.innerText()
    await moved(page, () => sentence.click())
    return words.slice(words.indexOf(':') + 1).split(',').length - 1
  }
}

/** Keys the values of the check that is asked, each in its own field. */
async function measure(page: Page, check: Check | null, values: Values): Promise<void> {
  for (const field of check?.measure ?? []) {
    const value = values[field.id]
    if (value === undefined) continue
    const panel = page.getByRole('region', { name: check?.prompt ?? '' })
    if (field.kind === 'number') await keyNumber(panel, field, value)
    else if (field.kind === 'text') await panel.getByLabel(field.label).fill(value)
    else await choose(panel, field, value)
  }
}

async function keyNumber(panel: Locator, { label }: Measure, value: string): Promise<void> {
  const keypad = panel.getByRole('textbox', { name: label })
  if ((await keypad.count()) === 0) await panel.getByRole('button', { name: label }).click()
  await keypad.fill(value)
  await panel.getByRole('button', { name: /^(Next value|Done)$/ }).click()
}

async function choose(panel: Locator, { label, options = [] }: Measure, value: string): Promise<void> {
  const option = named(options, ({ id }) => id === value, `${label} = ${value}`)
  const list = panel.getByRole('combobox', { name: label, exact: true })
  if ((await list.count()) > 0) await list.selectOption({ label: option.label })
  else await panel.getByRole('group', { name: label, exact: true }).getByRole('radio', { name: option.label, exact: true }).check()
}

async function giveReason(page: Page, check: Check | null, reason: string): Promise<void> {
  const { text } = named(check?.reasons ?? [], ({ id }) => id === reason, `reason ${reason} of ${check?.id ?? 'no check'}`)
  await page.getByRole('dialog').getByRole('button', { name: text, exact: true }).click()
}

/** Where the walk stands; null on the page of all places. */
async function whereIsIt(page: Page): Promise<Stop | null> {
  const places = page.getByRole('navigation', { name: 'Places' })
  const stop = page.getByRole('list', { name: /^Checks at / })
  await places.or(stop).waitFor()
  if ((await places.count()) > 0) return null
  const place = new URL(page.url()).pathname.split('/').at(-1) ?? ''
  const heading = await page.getByRole('heading', { level: 2 }).first().innerText()
  const prompt = page.locator('#check-prompt')
  if ((await prompt.count()) === 0) return { at: `${place}/rest`, heading }
  const words = await prompt.innerText()
  return { at: `${place}/${named(checklist.checks, (check) => check.prompt === words, words).id}`, heading }
}

/** Does something and waits until the screen shows another stop, or says that something was saved. */
async function moved(page: Page, act: () => Promise<void>): Promise<void> {
  const before = await page.evaluate(otherThan, null)
  await act()
  await page.waitForFunction(otherThan, before)
}

/** Runs in the page: what stands there now, or nothing while it is what stood there before. */
function otherThan(before: string | null): string {
  const words = (selector: string) => document.querySelector<HTMLElement>(selector)?.innerText ?? ''
  const now = [location.pathname, words('h2'), words('#check-prompt'), words('[data-slot=undo-bar]')].join('|')
  return now === before ? '' : now
}

function checkAt({ at }: Stop): Check | null {
  const id = at.slice(at.indexOf('/') + 1)
  return id === 'rest' ? null : checkOf(id)
}

function checkOf(id: string): Check {
  return named(checklist.checks, (check) => check.id === id, id)
}

function named<T>(all: readonly T[], is: (one: T) => boolean, what: string): T {
  const found = all.find(is)
  if (found === undefined) throw new Error(`the checklist knows no ${what}`)
  return found
}
