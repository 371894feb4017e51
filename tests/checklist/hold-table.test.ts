import { readdirSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import type { Book } from '@/lib/checklist/book'
import { HOLD_TABLE, type HoldRow } from '@/lib/checklist/hold-table'
import { openBook } from '@/lib/checklist/open-book'
import { parseChecklist } from '@/lib/checklist/parse-checklist'
import { parseLimits } from '@/lib/checklist/parse-limits'
import { holdRow, holdWords, pickableHolds, resolveHold } from '@/lib/checklist/resolve-hold'
import { aBook as openChecklist, aCheck, aChecklist } from './a-checklist'
import { checklistJson } from './read-checklist-file'

const row = (id: string) => HOLD_TABLE.find((one) => one.id === id) as HoldRow

type Json = Record<string, unknown>

/** A checklist with these checks, and the stations and facts they name. */
function aBook(checks: readonly Json[], changes: Json = {}): Book {
  const stations = [...new Set(checks.map(({ station }) => station as string))]
  const drive = { name: 'drive', subject: 'car', label: 'Drive', values: ['petrol', 'electric'].map((value) => ({ value, label: value })) }
  return openChecklist(
    aChecklist({
      facts: [drive],
      stations: stations.map((id) => ({ id, title: id, short: id, subject: 'car' })),
      places: [{ id: 'left', title: 'Left', subject: 'car', stand: 'On the left' }],
      checks,
      holdReasons: [],
      ...changes,
    }),
  )
}

/** A checklist with these stations of a car, one check each. */
function withStations(...stations: readonly string[]): Book {
  return aBook(stations.map((station) => aCheck(`${station}.first`, { station })))
}

// Written by hand from the product's table: reason, what is named where every station is there.
const ALL = ['seat', 'harness', 'cage', 'engine-bay', 'fuel', 'brakes', 'wheels-tyres', 'suspension', 'body', 'exhaust', 'high-voltage']
const NAMED: Readonly<Record<string, readonly string[]>> = {
  'light-contact': ['wheels-tyres', 'suspension', 'brakes', 'body'],
  'heavy-contact': ALL,
  'roll-over-fire': [],
  'gravel-grass': ['wheels-tyres', 'brakes', 'engine-bay', 'body'],
  'kerb-strike': ['wheels-tyres', 'suspension', 'exhaust', 'high-voltage'],
  'fluid-dropped': ['engine-bay', 'fuel', 'brakes', 'exhaust'],
  'noise-over': ['exhaust'],
  'brakes-changed': ['brakes'],
  'suspension-changed': ['suspension'],
  'wheel-set-changed': ['wheels-tyres'],
  'harness-touched': ['seat', 'harness', 'cage'],
}

test.each(Object.entries(NAMED))('%s names its stations wherever the checklist has them', (id, stations) => {
  expect([...resolveHold(row(id), 'car', withStations(...ALL), []).stations].sort()).toEqual([...stations].sort())
})

describe('[F5] a station that the checklist lacks', () => {
  test('is said in words, and the hold names the others', () => {
    const { stations, alsoLook } = resolveHold(row('light-contact'), 'car', withStations('wheels-tyres', 'body'), [])
    expect(stations).toEqual(['wheels-tyres', 'body'])
    expect(alsoLook).toEqual(['suspension and steering', 'brakes', 'leaks'])
  })

  test('and nothing else found either: nothing is named, so only the chief lifts it', () => {
    const { stations, checks, alsoLook } = resolveHold(row('noise-over'), 'car', withStations('wheels-tyres'), [])
    expect([stations, checks]).toEqual([[], []])
    expect(alsoLook).toEqual(['exhaust and noise'])
  })

  test('and that only some cars have: it is neither named nor missed', () => {
    expect(resolveHold(row('harness-touched'), 'car', withStations('seat', 'harness'), []).alsoLook).toEqual([])
  })

  test('no checklist at all: nothing is named, and all of it is said', () => {
    const none = resolveHold(row('noise-over'), 'car', null, [])
    expect(none).toEqual({ stations: [], checks: [], alsoLook: ['exhaust and noise'] })
  })
})

test('[F5] a station of which nothing applies to this car is not named, or only the chief could end the hold', () => {
  const book = aBook([
    aCheck('wheels.nuts', { station: 'wheels' }),
    aCheck('high-voltage.cable', { station: 'high-voltage', applies: { fact: 'drive', is: 'electric' } }),
  ])
  expect(resolveHold(row('kerb-strike'), 'car', book, [{ drive: 'petrol' }]).stations).toEqual(['wheels'])
  // Not known: it may apply.
  expect(resolveHold(row('kerb-strike'), 'car', book, [{}]).stations).toEqual(['wheels', 'high-voltage'])
  // Of two who said different things of the car, one is enough.
  expect(resolveHold(row('kerb-strike'), 'car', book, [{ drive: 'petrol' }, { drive: 'electric' }]).stations).toContain('high-voltage')
})

test('what a checklist names itself under the same id comes to the table’s, never in its place', () => {
  const book = aBook([aCheck('wheels.nuts', { station: 'wheels' }), aCheck('mirror.glass', { station: 'mirror' })], {
    holdReasons: [{ id: 'light-contact', text: 'A knock', subject: 'car', stations: ['mirror'], checks: [] }],
  })
  expect(resolveHold(row('light-contact'), 'car', book, []).stations).toEqual(['wheels', 'mirror'])
  expect(holdWords('light-contact', book)).toBe('Light contact, one corner')
})

test('a checklist’s own reasons can be picked beside the table’s, and something else always', () => {
  const book = aBook([aCheck('wheels.nuts', { station: 'wheels' })], {
    holdReasons: [{ id: 'lost-wheel', text: 'Lost a wheel', subject: 'car', stations: ['wheels'], checks: [] }],
  })
  const ids = pickableHolds(book).map(({ id }) => id)
  expect(ids.slice(-2)).toEqual(['lost-wheel', 'something-else'])
  expect(resolveHold(holdRow('lost-wheel', book) as HoldRow, 'car', book, []).stations).toEqual(['wheels'])
  expect(holdWords('a-newer-reason', book)).toBe('a newer reason')
})

test('a switch of the event is no reason to pick for one car', () => {
  expect(pickableHolds(null).map(({ id }) => id)).not.toContain('wet-declared')
})

test('a person’s hold without a station touches no car, and the chief alone ends it', () => {
  for (const id of ['driving-standard', 'no-briefing']) {
    expect(row(id)).toMatchObject({ car: null, person: [], isChiefOnly: true })
    expect(resolveHold(row(id), 'person', withStations('wheels'), []).stations).toEqual([])
  }
})

test('roll-over and fire: nothing that is seen again ends it', () => {
  expect(resolveHold(row('roll-over-fire'), 'car', withStations(...ALL), [])).toEqual({ stations: [], checks: [], alsoLook: [] })
})

describe.each(shippedBooks())('the shipped checklist $name', ({ book }) => {
  test.each(HOLD_TABLE.map(({ id }) => id))('%s names only what the checklist has', (id) => {
    for (const part of ['car', 'person', 'fit'] as const) {
      const { stations, checks } = resolveHold(row(id), part, book, [])
      expect(stations.filter((station) => !book.stations.has(station))).toEqual([])
      expect(checks.filter((check) => !book.byId.has(check))).toEqual([])
    }
  })

  test('each reason of a car leaves something to see, or says what, or is the chief’s alone', () => {
    for (const one of HOLD_TABLE.filter(({ car, isChiefOnly }) => car !== null && !isChiefOnly)) {
      const { stations, checks, alsoLook } = resolveHold(one, 'car', book, [])
      expect(stations.length + checks.length + alsoLook.length, one.id).toBeGreaterThan(0)
    }
  })
})

function shippedBooks(): readonly { readonly name: string; readonly book: Book }[] {
  const folder = join(import.meta.dirname, '../../checklists/closed-circuit')
  return readdirSync(folder)
    .sort()
    .map((name) => {
      const checklist = parseChecklist(checklistJson(`closed-circuit/${name}`))
      const limits = parseLimits(checklistJson('limits/track-day.json'))
      if (!checklist.ok || !limits.ok) throw new Error(`${name} cannot be read`)
      return { name, book: openBook(checklist.checklist, limits.limits, { checklist: 'c'.repeat(64), limits: 'd'.repeat(64) }) }
    })
}
