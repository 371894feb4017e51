import { applicableChecks } from '@/lib/checklist/applicable-checks'
import type { Book } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { PassState, SubjectState } from '@/lib/inspection/state'
import { hasPassed, isValidOn } from './may-run'
import type { ListedBlock, ListedPerson } from './pass-list'
import { decodeToken } from './token'

/** A person named for a car: how they stand themselves, and in this car. */
export interface PersonForList {
  readonly person: string
  readonly role: ListedPerson['role']
  readonly name: string
  /** Null where nothing was ever recorded of them; of the fit the same. */
  readonly state: SubjectState | null
  readonly blocks: readonly ListedBlock[]
  readonly fit: SubjectState | null
}

/**
 * A person's line under a car: band and fit as rule P8 wants them, and why there is none. `facts` are those of each `presented` of the car, before one
 * those of its entry: a fit is asked where any of them asks for it.
 */
export function listPerson(
  who: PersonForList,
  facts: readonly CarFacts[],
  on: { readonly day: string; readonly book: Book | null },
): ListedPerson {
  const bands = (who.state?.passes ?? []).filter(({ record }) => record.kind === 'band')
  const ofToday = bands.filter((band) => coversDay(band, on.day))
  const live = ofToday.findLast(({ state }) => state === 'live')
  const last = live ?? bands.at(-1)
  const band = bandOf(who, live !== undefined, bands.length > 0)
  const fit = fitOf(who.fit, facts, on.book)
  const bandNumber = last?.record.kind === 'band' ? last.record.bandNumber : null
  const why = band === 'live' ? FIT_WORDS[fit] : whyNoBand(who, band, ofToday.length > 0)
  return { person: who.person, name: who.name, role: who.role, bandNumber, band, why, fit }
}

function bandOf({ state, blocks }: PersonForList, hasLive: boolean, hadAny: boolean): ListedPerson['band'] {
  if (!hasLive || state === null) return hadAny ? 'dead' : 'none'
  // As with a car and its pass: a band lets go only somebody who still reads passed. What could not be seen since kills no band.
  return blocks.length > 0 || !hasPassed(state) ? 'held' : 'live'
}

const FIT_WORDS: Readonly<Record<ListedPerson['fit'], string>> = {
  failed: 'does not fit this car',
  open: 'fit in this car not seen',
  passed: '',
  'not-asked': '',
}

function whyNoBand({ state, blocks }: PersonForList, band: Exclude<ListedPerson['band'], 'live'>, hadToday: boolean): string {
  const words = blocks.map((block) => block.words).join(', ')
  if (band === 'none') return words ? `no band: ${words}` : 'no band yet'
  if (band === 'held') return `held: ${words || `reads ${state?.verdict ?? 'not presented'}`}`
  if (words) return `band is dead: ${words}`
  return hadToday ? 'band is dead: to be seen again' : 'band is of another day'
}

function coversDay({ record }: PassState, day: string): boolean {
  const decoded = decodeToken(record.token)
  return decoded.ok && decoded.token.payload.type === 'band' && isValidOn(decoded.token.payload, day)
}

function fitOf(state: SubjectState | null, facts: readonly CarFacts[], book: Book | null): ListedPerson['fit'] {
  if (state && state.fails.length > 0) return 'failed'
  if (state && state.blocks.length === 0 && hasPassed(state)) return 'passed'
  if (state && (state.blocks.length > 0 || state.presentedHeads.length > 0)) return 'open'
  if (book === null) return 'open'
  return facts.some((one) => applicableChecks(book, 'fit', one).some((check) => check.required)) ? 'open' : 'not-asked'
}
