/** What a record is about. A *car* is an entry (one car at one event); a *fit* is a person in a car. */
export type Subject =
  { readonly car: string } | { readonly person: string } | { readonly fit: string; readonly person: string } | { readonly event: string }

export type SubjectKind = 'car' | 'person' | 'fit' | 'event'

/** A string that two equal subjects share: `car:<entry>`, `person:<person>`, `fit:<entry>:<person>`, `event:<event>`. */
export type SubjectKey = string

/** The kind of a subject. */
export function subjectKind(subject: Subject): SubjectKind {
  if ('car' in subject) return 'car'
  if ('fit' in subject) return 'fit'
  if ('person' in subject) return 'person'
  return 'event'
}

/** The kind of a subject that is judged. */
export function judgedKind(subject: Exclude<Subject, { event: string }>): Exclude<SubjectKind, 'event'> {
  if ('car' in subject) return 'car'
  return 'fit' in subject ? 'fit' : 'person'
}

/** The key of a subject, for maps and for the database. */
export function subjectKey(subject: Subject): SubjectKey {
  if ('car' in subject) return `car:${subject.car}`
  if ('fit' in subject) return `fit:${subject.fit}:${subject.person}`
  if ('person' in subject) return `person:${subject.person}`
  return `event:${subject.event}`
}

/** The kind of the subject that a key names. */
export function kindOfKey(key: SubjectKey): SubjectKind {
  const kind = key.slice(0, key.indexOf(':'))
  return kind === 'car' || kind === 'fit' || kind === 'person' ? kind : 'event'
}
