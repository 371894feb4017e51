import type { ListedEntry, ListedPerson } from './pass-list'

/** A person named for a car, and whether they may go out in it. */
export interface PersonAboard {
  readonly name: string
  readonly bandNumber: string | null
  readonly drives: boolean
  readonly may: boolean
  /** Why not; empty when they may. */
  readonly why: string
}

/** Who is named for the car, and who of them may go (rule P8): a live band, and the fit passed where it is asked. */
export function peopleAboard(entry: ListedEntry): readonly PersonAboard[] {
  return entry.people.map((person) => {
    const why = whyNot(person)
    return { name: person.name, bandNumber: person.bandNumber, drives: person.role !== 'passenger', may: why === '', why }
  })
}

function whyNot({ band, fit, why }: ListedPerson): string {
  if (band === 'none') return why || 'no band'
  if (band === 'dead') return why || 'band is dead'
  if (band === 'held') return why || 'held'
  if (fit === 'failed') return why || 'does not fit this car'
  if (fit === 'open') return why || 'fit in this car not seen'
  return ''
}
