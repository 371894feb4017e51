import type { Book, BookCheck } from '@/lib/checklist/book'
import type { Checklist, Limits } from '@/lib/checklist/checklist'
import { openBook } from '@/lib/checklist/open-book'
import { fakeHash } from './paddock-hash'

type Definition = Checklist['checks'][number]

/** A check as short as it can be; a test states only what matters to it. */
function aCheck(id: string, given: Partial<Definition> = {}): Definition {
  return {
    id,
    subject: 'car',
    station: id.split('.')[0] as string,
    place: 'front',
    prompt: `${id} in order`,
    how: 'look and touch',
    short: id,
    critical: false,
    standing: false,
    depth: 'look-over',
    required: true,
    reasons: [{ id: 'other', text: 'anything else' }],
    reopens: [],
    ...given,
  }
}

const depthField = { kind: 'number', id: 'depthMm', label: 'tread depth', unit: 'mm', min: 0, max: 20, decimals: 1 } as const

/**
 * A small checklist that has one check of each sort a rule speaks of: perishable and standing, measured, optional, reopening others,
 * deeper than the look-over, only under a fact, tagged wet, and one each for a person and a fit.
 */
export const paddockChecklist: Checklist = {
  id: 'paddock',
  version: 1,
  title: 'Paddock test list',
  kindOfDay: 'closed-circuit',
  facts: [
    {
      name: 'cage',
      subject: 'car',
      label: 'a cage is fitted',
      values: [
        { value: true, label: 'yes' },
        { value: false, label: 'no' },
      ],
    },
    {
      name: 'slicks',
      subject: 'car',
      label: 'it runs slicks',
      values: [
        { value: true, label: 'yes' },
        { value: false, label: 'no' },
      ],
    },
  ],
  stations: [
    { id: 'brakes', title: 'Brakes', short: 'brakes', subject: 'car' },
    { id: 'wheels', title: 'Wheels and tyres', short: 'wheels', subject: 'car' },
    { id: 'seat', title: 'Seat', short: 'seat', subject: 'car' },
    { id: 'body', title: 'Body', short: 'body', subject: 'car' },
    { id: 'cage', title: 'Cage', short: 'cage', subject: 'car' },
    { id: 'helmet', title: 'Helmet and kit', short: 'helmet', subject: 'person' },
    { id: 'reach', title: 'Fit', short: 'fit', subject: 'fit' },
  ],
  places: [
    { id: 'front', title: 'Front', subject: 'car', stand: 'at the front' },
    { id: 'rear', title: 'Rear', subject: 'car', stand: 'at the rear' },
    { id: 'desk', title: 'Desk', subject: 'person', stand: 'at the desk' },
    { id: 'cabin', title: 'Cabin', subject: 'fit', stand: 'at the door' },
  ],
  checks: [
    aCheck('brakes.pads', { reopens: ['wheels.nuts'], critical: true }),
    aCheck('wheels.tread', {
      measure: [depthField],
      rule: {
        name: 'tyre-tread',
        inputs: { leastMm: { measure: 'depthMm' }, innerEdgeMm: { measure: 'depthMm' } },
        params: { failBelowMm: 1.6, adviseBelowMm: 2 },
      },
    }),
    aCheck('wheels.nuts', { place: ['front', 'rear'], critical: true }),
    aCheck('seat.mounts', { standing: true }),
    aCheck('body.mirror', { required: false }),
    aCheck('body.undertray', { depth: 'full' }),
    aCheck('cage.feet', { applies: { fact: 'cage', is: true }, standing: true }),
    aCheck('wheels.rain', { depth: 'full', tags: ['wet'], applies: { fact: 'slicks', is: true } }),
    aCheck('helmet.label', { subject: 'person', place: 'desk' }),
    aCheck('reach.headroom', { subject: 'fit', place: 'cabin' }),
  ],
  holdReasons: [{ id: 'contact', text: 'light contact', subject: 'car', stations: ['body'], checks: [] }],
}

function limitsOf(id: string, failBelowMm: number): Limits {
  return { id, version: 1, title: id, rules: { 'tyre-tread': { failBelowMm } } }
}

export const PADDOCK_CHECKLIST = fakeHash('checklist')
export const PADDOCK_LIMITS = fakeHash('limits')
export const TIGHTER_LIMITS = fakeHash('tighter limits')

const books: Readonly<Record<string, Book>> = {
  [PADDOCK_LIMITS]: openBook(paddockChecklist, limitsOf('track-day', 1.6), { checklist: PADDOCK_CHECKLIST, limits: PADDOCK_LIMITS }),
  [TIGHTER_LIMITS]: openBook(paddockChecklist, limitsOf('national', 2), { checklist: PADDOCK_CHECKLIST, limits: TIGHTER_LIMITS }),
}

/** The test book under one of its two sets of limits; null for any other hashes. */
export function paddockBook(checklist: string = PADDOCK_CHECKLIST, limits: string = PADDOCK_LIMITS): Book | null {
  return checklist === PADDOCK_CHECKLIST ? (books[limits] ?? null) : null
}

/** A check of the test book by id. */
export function paddockCheck(id: string, limits: string = PADDOCK_LIMITS): BookCheck {
  const check = books[limits]?.byId.get(id)
  if (!check) throw new Error(`the test book has no check ${id}`)
  return check
}
