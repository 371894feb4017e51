/** As much of an entry as people see of a car. */
export interface SeenCar {
  readonly id: string
  readonly number: string
  readonly plate: string
  readonly colour: string
  readonly model: string
  readonly groupName: string
  readonly people: readonly { readonly person: string; readonly role: string }[]
}

/**
 * Cars that fit what somebody saw: every word must be found in number, plate, colour, model, group or a name; `passenger` means that somebody rides along.
 * Words may be begun only. The car most of whose words begin something comes first. Nothing said finds nothing.
 */
export function describeCars<C extends SeenCar>(cars: readonly C[], said: string, names: ReadonlyMap<string, string>): readonly C[] {
  const wanted = wordsIn(said)
  if (wanted.length === 0) return []
  return cars
    .flatMap((car) => {
      const known = knownOf(car, names)
      if (!wanted.every((word) => known.some((one) => one.includes(word)))) return []
      return [{ car, begun: wanted.filter((word) => known.some((one) => one.startsWith(word))).length }]
    })
    .sort((a, b) => b.begun - a.begun || a.car.number.localeCompare(b.car.number, 'en', { numeric: true }))
    .map(({ car }) => car)
}

function knownOf({ number, plate, colour, model, groupName, people }: SeenCar, names: ReadonlyMap<string, string>): readonly string[] {
  const aboard = people.map(({ person }) => names.get(person) ?? '')
  const rides = people.some(({ role }) => role !== 'driver') ? ['passenger'] : []
  // The plate also in one piece: nobody types its gap.
  return [...[number, plate, colour, model, groupName, ...aboard].flatMap(wordsIn), wordsIn(plate).join(''), ...rides]
}

function wordsIn(text: string): readonly string[] {
  return text.toLowerCase().match(/[\p{L}\p{N}]+/gu) ?? []
}
