import type { DeskPerson } from './desk-people'

/**
 * Who answers to what was typed, best first: the very number or plate of a car (all who sit in it), then names whose words begin with each word typed, then
 * numbers that begin so and plates and names that hold it. Nothing typed finds nobody.
 */
export function searchPeople<P extends DeskPerson>(people: readonly P[], query: string): readonly P[] {
  const words = wordsIn(query)
  const whole = words.join('')
  if (whole === '') return []
  return people
    .flatMap((person) => {
      const place = rank(person, words, whole)
      return place === null ? [] : [{ person, place }]
    })
    .sort((a, b) => a.place - b.place)
    .map(({ person }) => person)
}

function rank({ name, seats }: DeskPerson, words: readonly string[], whole: string): number | null {
  const cars = seats.map(({ entry }) => ({ number: fold(entry.number), plate: fold(entry.plate) }))
  if (cars.some(({ number, plate }) => number === whole || plate === whole)) return 0
  const named = wordsIn(name)
  if (words.every((word) => named.some((one) => one.startsWith(word)))) return 1
  if (cars.some(({ number, plate }) => number.startsWith(whole) || plate.includes(whole))) return 2
  return words.every((word) => named.some((one) => one.includes(word))) ? 3 : null
}

/** Case and accents aside: nobody looks for the key of an accent at a desk. */
function wordsIn(text: string): readonly string[] {
  const plain = text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase()
  return plain.match(/[\p{L}\p{N}]+/gu) ?? []
}

function fold(text: string): string {
  return wordsIn(text).join('')
}
