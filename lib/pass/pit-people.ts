import type { ListedEntry, ListedPerson } from './pass-list'
import type { PitPerson } from './pit-answer'
import type { PitBlock } from './pit-device'

/**
 * Who is named for the car, and who of them may go (rule P8): a live band, the fit passed where it is asked, and no block of this device.
 * Only who is named as a driver drives: an instructor rides.
 */
export function peopleAboard(entry: ListedEntry, blocks: readonly PitBlock[]): readonly PitPerson[] {
  return entry.people.map((person) => {
    const block = blocks.find(({ about }) => 'person' in about && about.person === person.person)
    const why = block?.words ?? whyNot(person)
    const { name, bandNumber, role } = person
    return { person: person.person, name, bandNumber, drives: role === 'driver', may: why === '', why }
  })
}

function whyNot({ band, fit, why }: ListedPerson): string {
  switch (band) {
    case 'live':
      return fit === 'passed' || fit === 'not-asked' ? '' : why || FIT_WORDS[fit]
    case 'none':
    case 'dead':
    case 'held':
      return why || BAND_WORDS[band]
    default:
      // A list of a newer build: a state this one does not know lets nobody go.
      return 'this device does not know the state of this band'
  }
}

const BAND_WORDS = { none: 'no band', dead: 'band is dead', held: 'held' } as const
const FIT_WORDS = { failed: 'does not fit this car', open: 'fit in this car not seen' } as const

/** `Ana Brand (band 112)`. */
export function nameWithBand({ name, bandNumber }: Pick<PitPerson, 'name' | 'bandNumber'>): string {
  return bandNumber === null ? name : `${name} (band ${bandNumber})`
}
