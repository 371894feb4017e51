/** What an entry may lack without being wrong: what the day will need and nobody has said yet. */
export const MISSING_WORDS = {
  driver: 'a driver',
  email: 'an e-mail',
  colour: 'a colour',
  facts: 'car facts',
} as const
export type MissingData = keyof typeof MISSING_WORDS

/** What this entry lacks. An e-mail counts as there when any of its drivers has one. */
export function missingData(entry: {
  readonly colour: string
  readonly hasFacts: boolean
  readonly drivers: readonly { readonly email: string }[]
}): readonly MissingData[] {
  const { colour, hasFacts, drivers } = entry
  return [
    ...(drivers.length === 0 ? (['driver'] as const) : []),
    ...(drivers.length > 0 && drivers.every(({ email }) => email === '') ? (['email'] as const) : []),
    ...(colour === '' ? (['colour'] as const) : []),
    ...(hasFacts ? [] : (['facts'] as const)),
  ]
}
