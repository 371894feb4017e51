import { foldWord, type RowRemark } from './entry-row'
import type { Asking } from './list-question'
import type { PlannedEntry, PlannedPerson } from './planned-entry'

/** One human of a list, whatever cars they sit in. */
export interface OnePerson {
  readonly name: string
  email: string
  mobile: string
  readonly row: number
}

/** Which human each planned seat is. */
export interface People {
  readonly of: (person: PlannedPerson) => OnePerson
  readonly all: readonly OnePerson[]
  readonly remarks: readonly RowRemark[]
}

/**
 * Who is one person. The same name with the same e-mail, or with the same mobile and no other e-mail, is one; one e-mail under two names, or one name and mobile
 * under two e-mails, is asked; the same name alone is two people, and said.
 */
export function resolvePeople(entries: readonly PlannedEntry[], asking: Asking): People {
  const found = new Map<string, OnePerson>()
  const [byEmail, byMobile, byName] = [new Map<string, OnePerson>(), new Map<string, OnePerson>(), new Map<string, OnePerson>()]
  const all: OnePerson[] = []
  const remarks: RowRemark[] = []
  const told = new Set<string>()
  for (const { people } of entries) {
    for (const person of people) {
      const key = keyOf(person)
      if (found.has(key)) continue
      const name = foldWord(person.name)
      const mobile = person.mobile.replace(/\D/g, '')
      const [sameEmail, sameMobile] = [
        person.email === '' ? undefined : byEmail.get(person.email),
        mobile === '' ? undefined : byMobile.get(`${name} ${mobile}`),
      ]
      const one = isSame(asking, person, sameEmail, sameMobile)
      if (one !== null) {
        one.email ||= person.email
        one.mobile ||= person.mobile
        found.set(key, one)
        continue
      }
      const namesake = byName.get(name)
      if (namesake !== undefined && sameEmail === undefined && sameMobile === undefined && !told.has(name)) {
        told.add(name)
        remarks.push({
          row: person.row,
          words: `${person.name} stands in row ${namesake.row} too, with another address: taken as two people.`,
        })
      }
      const made: OnePerson = { name: person.name, email: person.email, mobile: person.mobile, row: person.row }
      all.push(made)
      found.set(key, made)
      if (made.email !== '' && !byEmail.has(made.email)) byEmail.set(made.email, made)
      if (mobile !== '' && !byMobile.has(`${name} ${mobile}`)) byMobile.set(`${name} ${mobile}`, made)
      if (!byName.has(name)) byName.set(name, made)
    }
  }
  return {
    all,
    remarks,
    of: (person) => found.get(keyOf(person)) ?? { name: person.name, email: person.email, mobile: person.mobile, row: person.row },
  }
}

function isSame(
  asking: Asking,
  person: PlannedPerson,
  sameEmail: OnePerson | undefined,
  sameMobile: OnePerson | undefined,
): OnePerson | null {
  if (sameEmail !== undefined && foldWord(sameEmail.name) === foldWord(person.name)) return sameEmail
  if (sameMobile !== undefined && (sameMobile.email === '' || person.email === '' || sameMobile.email === person.email)) return sameMobile
  const other = sameEmail ?? sameMobile
  if (other === undefined) return null
  const why =
    sameEmail === undefined
      ? `the same mobile, ${person.mobile}, and other e-mails (${other.email}, ${person.email})`
      : `the same e-mail, ${person.email}`
  const answer = asking.ask(
    {
      id: `person:${person.row}:${foldWord(person.name)}`,
      asks: `${other.name} (row ${other.row}) and ${person.name} (row ${person.row}) have ${why}. Are they one person?`,
      rows: [],
      options: [
        { value: 'one', words: `One person, ${other.name}, who needs one band`, asks: null },
        { value: 'two', words: 'Two people, each with a band of their own', asks: null },
      ],
      likely: null,
    },
    ({ value }) => (value === 'one' ? `They are one person, ${other.name}.` : 'They are two people.'),
  )
  return answer?.value === 'one' ? other : null
}

function keyOf({ name, email, mobile }: PlannedPerson): string {
  return `${foldWord(name)}\n${email}\n${mobile.replace(/\D/g, '')}`
}
