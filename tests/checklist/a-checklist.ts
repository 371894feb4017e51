import { openCheckedBook } from '@/lib/checklist/open-checked-book'
import { parseChecklist } from '@/lib/checklist/parse-checklist'
import type { Book } from '@/lib/checklist/book'
import type { Limits } from '@/lib/checklist/checklist'

type Json = Record<string, unknown>

/** A check that nothing is wrong with; `changes` replace its fields. */
export function aCheck(id: string, changes: Json = {}): Json {
  return {
    id,
    subject: 'car',
    station: 'wheels',
    place: 'left',
    prompt: 'All nuts there',
    how: 'Wrench on each',
    short: 'nuts',
    critical: false,
    standing: false,
    depth: 'look-over',
    required: true,
    reasons: [{ id: 'other', text: 'Anything else I do not like' }],
    reopens: [],
    ...changes,
  }
}

/** A small checklist that nothing is wrong with: two corners, a person's station, three facts, one check per corner and two others. */
export function aChecklist(changes: Json = {}): Json {
  return {
    id: 'small',
    version: 1,
    title: 'A small checklist',
    kindOfDay: 'closed-circuit',
    facts: [
      {
        name: 'belts',
        subject: 'car',
        label: 'Belts',
        values: [
          { value: 'standard', label: 'Road belts' },
          { value: 'harness', label: 'Harness' },
        ],
      },
      {
        name: 'seats',
        subject: 'car',
        label: 'Seats',
        values: [
          { value: 1, label: 'One' },
          { value: 2, label: 'Two' },
        ],
      },
      {
        name: 'openCar',
        subject: 'person',
        label: 'Open car',
        values: [
          { value: true, label: 'Yes' },
          { value: false, label: 'No' },
        ],
      },
    ],
    stations: [
      { id: 'wheels', title: 'Wheels', short: 'Wheels', subject: 'car' },
      { id: 'kit', title: 'Kit', short: 'Kit', subject: 'person' },
    ],
    places: [
      { id: 'left', title: 'Left', subject: 'car', stand: 'On the left' },
      { id: 'right', title: 'Right', subject: 'car', stand: 'On the right' },
      { id: 'desk', title: 'Desk', subject: 'person', stand: 'At the desk' },
    ],
    checks: [
      aCheck('wheels.nuts', { place: ['left', 'right'], critical: true }),
      aCheck('wheels.tread', {
        place: ['left', 'right'],
        short: 'tread',
        reopens: ['wheels.nuts'],
        measure: [
          { kind: 'number', id: 'least', label: 'Least', unit: 'mm', min: 0, max: 20, decimals: 1 },
          { kind: 'number', id: 'inner', label: 'Inner edge', unit: 'mm', min: 0, max: 20, decimals: 1 },
        ],
        rule: {
          name: 'tyre-tread',
          inputs: { leastMm: { measure: 'least' }, innerEdgeMm: { measure: 'inner' } },
          params: { failBelowMm: 1.6, adviseBelowMm: 2 },
        },
      }),
      aCheck('wheels.cap', { short: 'caps', depth: 'standard', standing: true, reopens: ['wheels.nuts'] }),
      aCheck('kit.shoes', { subject: 'person', station: 'kit', place: 'desk', short: 'shoes' }),
    ],
    holdReasons: [{ id: 'contact', text: 'Contact', subject: 'car', stations: ['wheels'], checks: ['wheels.nuts.left'] }],
    ...changes,
  }
}

/** The same with one more check. */
export function aChecklistWith(...checks: readonly Json[]): Json {
  const base = aChecklist()
  return { ...base, checks: [...(base['checks'] as Json[]), ...checks] }
}

/** Opens a checklist that must be right. */
export function aBook(json: Json = aChecklist(), rules: Limits['rules'] = {}): Book {
  const parsed = parseChecklist(json)
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problems))
  return openCheckedBook(
    parsed.checklist,
    { id: 'none', version: 1, title: 'No limits of its own', rules },
    { checklist: 'c'.repeat(64), limits: 'd'.repeat(64) },
  )
}
