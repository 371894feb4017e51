/** As much of an entry as the desk reads. */
export interface DeskEntry {
  readonly id: string
  readonly number: string
  readonly plate: string
  readonly model: string
  readonly group: string
  readonly groupName: string
  readonly withdrawn: boolean
  readonly facts: Readonly<Record<string, string | number | boolean | null>>
  readonly people: readonly { readonly person: string; readonly role: 'driver' | 'passenger' | 'instructor' }[]
}

export interface DeskSeat {
  readonly entry: DeskEntry
  readonly role: DeskEntry['people'][number]['role']
}

/** Somebody who is to sit in a car today, with every car they sit in. */
export interface DeskPerson {
  readonly id: string
  readonly name: string
  readonly minor: boolean
  readonly seats: readonly DeskSeat[]
}

/** Everybody who sits in a car that is not withdrawn, once each, by name: one person with two cars is one line, a shared car gives two. */
export function deskPeople(
  people: readonly { readonly id: string; readonly name: string; readonly minor: boolean }[],
  entries: readonly DeskEntry[],
): readonly DeskPerson[] {
  const seats = new Map<string, DeskSeat[]>()
  for (const entry of entries.filter(({ withdrawn }) => !withdrawn))
    for (const { person, role } of entry.people) {
      const own = seats.get(person)
      if (own === undefined) seats.set(person, [{ entry, role }])
      else own.push({ entry, role })
    }
  return people
    .flatMap(({ id, name, minor }) => {
      const own = seats.get(id)
      return own === undefined ? [] : [{ id, name, minor, seats: own }]
    })
    .sort((a, b) => a.name.localeCompare(b.name, 'en'))
}

/** People by the group they are needed for first: an instructor of twelve cars stands in one list, that of the earliest. */
export function byFirstGroup<P extends DeskPerson>(
  people: readonly P[],
  groups: readonly { readonly id: string; readonly order: number }[],
): ReadonlyMap<string, readonly P[]> {
  const order = new Map(groups.map(({ id, order: place }) => [id, place]))
  const lists = new Map<string, P[]>()
  for (const person of people) {
    const group = firstGroup(person, order)
    const own = lists.get(group)
    if (own === undefined) lists.set(group, [person])
    else own.push(person)
  }
  return lists
}

function firstGroup({ seats }: DeskPerson, order: ReadonlyMap<string, number>): string {
  const places = seats.map(({ entry }) => ({ group: entry.group, place: order.get(entry.group) ?? order.size }))
  return places.sort((a, b) => a.place - b.place)[0]?.group ?? ''
}
