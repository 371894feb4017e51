import type { EntryEdit } from '@/lib/contracts/entry-edit'
import { plateTail } from '@/lib/pass/plate-tail'
import { foldWord } from './entry-row'

/** Fields of an entry, as the office calls them. */
export const EDIT_WORDS = {
  number: 'number',
  plate: 'plate',
  group: 'run group',
  model: 'car',
  colour: 'colour',
  passengerSeats: 'passenger seats',
  note: 'note',
  facts: 'car facts',
  people: 'people',
  contacts: 'contacts',
  withdrawn: 'withdrawal',
} as const
export type EditField = keyof typeof EDIT_WORDS

/** What a change of an entry says in the day's log. */
export type RecordedChange =
  | { readonly what: 'withdrawn' | 'returned' | 'facts' }
  | { readonly what: 'number'; readonly number: string }
  | { readonly what: 'plate'; readonly plateTail: string }
  | { readonly what: 'group'; readonly group: string }
  | { readonly what: 'people'; readonly added: string[]; readonly removed: string[]; readonly passengers: string[] }

type Person = EntryEdit['people'][number]
/** Somebody in a car whose id is known, new or not. */
export type SeatedPerson = Person & { readonly person: string }

/** Which fields an edit changes. People are who and as what; their contacts are a field of their own. */
export function changedFields(before: EntryEdit, after: EntryEdit): readonly EditField[] {
  const plain = (['number', 'plate', 'group', 'model', 'colour', 'passengerSeats', 'note', 'withdrawn'] as const).filter(
    (field) => before[field] !== after[field],
  )
  return [
    ...plain,
    ...(sameFacts(before.facts, after.facts) ? [] : (['facts'] as const)),
    ...(sameSeats(before.people, after.people) ? [] : (['people'] as const)),
    ...(sameContacts(before.people, after.people) ? [] : (['contacts'] as const)),
  ]
}

/**
 * The records that an edit of an entry with records is (SYNC: `entry-changed`): number, plate, group, facts, people, withdrawn and returned. Another car under
 * the same entry is a change of its facts. Colour, seats and notes are no record: nothing was judged by them.
 */
export function recordedChanges(
  fields: readonly EditField[],
  before: EntryEdit,
  after: EntryEdit & { readonly people: readonly SeatedPerson[] },
): readonly RecordedChange[] {
  const has = (field: EditField) => fields.includes(field)
  return [
    ...(has('number') ? [{ what: 'number' as const, number: after.number }] : []),
    ...(has('plate') ? [{ what: 'plate' as const, plateTail: plateTail(after.plate) }] : []),
    ...(has('group') ? [{ what: 'group' as const, group: after.group }] : []),
    ...(has('facts') || has('model') ? [{ what: 'facts' as const }] : []),
    ...(has('people') ? [peopleChange(before.people, after.people)] : []),
    ...(has('withdrawn') ? [{ what: after.withdrawn ? ('withdrawn' as const) : ('returned' as const) }] : []),
  ]
}

function peopleChange(before: readonly Person[], after: readonly SeatedPerson[]): RecordedChange {
  const [was, is] = [new Set(before.map(({ person }) => person)), new Set<string | null>(after.map(({ person }) => person))]
  const wasPassenger = new Set(before.filter(({ role }) => role === 'passenger').map(({ person }) => person))
  return {
    what: 'people',
    added: unique(after.filter(({ person }) => !was.has(person)).map(({ person }) => person)),
    removed: unique(before.flatMap(({ person }) => (person === null || is.has(person) ? [] : [person]))),
    // Whoever becomes a passenger counts, also the driver of before: a recall may wait for one (rule F13).
    passengers: unique(after.filter(({ person, role }) => role === 'passenger' && !wasPassenger.has(person)).map(({ person }) => person)),
  }
}

function unique(ids: readonly string[]): string[] {
  return [...new Set(ids)]
}

function sameFacts(a: EntryEdit['facts'], b: EntryEdit['facts']): boolean {
  const told = (facts: EntryEdit['facts']) =>
    Object.entries(facts)
      .filter(([, value]) => value !== null)
      .sort(([left], [right]) => (left < right ? -1 : 1))
  return JSON.stringify(told(a)) === JSON.stringify(told(b))
}

function sameSeats(a: readonly Person[], b: readonly Person[]): boolean {
  const seats = (people: readonly Person[]) => people.map(({ person, role }) => `${person ?? 'new'} ${role}`).sort()
  return JSON.stringify(seats(a)) === JSON.stringify(seats(b))
}

function sameContacts(a: readonly Person[], b: readonly Person[]): boolean {
  const known = new Map(a.map((one) => [one.person, one]))
  return b.every((one) => {
    const was = known.get(one.person)
    return was === undefined || (was.name === one.name && was.email === one.email && was.mobile === one.mobile)
  })
}

/** Problems of an edit that its schema cannot see, by the form's path. */
export function editProblems(edit: EntryEdit): readonly { readonly path: string; readonly message: string }[] {
  const seen = new Set<string>()
  return edit.people.flatMap(({ person, name, email, role }, index) => {
    const key = `${role} ${person ?? `${foldWord(name)} ${email}`}`
    if (seen.has(key)) return [{ path: `edit.people.${index}.name`, message: 'This person is in the car twice.' }]
    seen.add(key)
    return []
  })
}
