import * as z from 'zod/mini'

/**
 * Schema pieces for a rule's inputs. Each carries its possible range as the message of its error, so that a value that cannot be true
 * is answered with the range ("0 to 20 mm") and not with a parser's words. All are optional: missing is for the rule to see.
 */

/** A number within what is physically possible, limits included. */
export function numberBetween(min: number, max: number, unit: string) {
  const error = `${min} to ${max}${unit === '' ? '' : ` ${unit}`}`
  return z.optional(z.number({ error }).check(z.gte(min, { error }), z.lte(max, { error })))
}

/** A whole number within what is possible, limits included: a year, a month. */
export function wholeBetween(min: number, max: number) {
  const error = `a whole number, ${min} to ${max}`
  return z.optional(z.int({ error }).check(z.gte(min, { error }), z.lte(max, { error })))
}

/** One of a list of ids. */
export function oneOf<const T extends readonly [string, ...string[]]>(ids: T) {
  return z.optional(z.enum(ids, { error: 'one of the list' }))
}

/** Yes or no: true and false, or the ids `yes` and `no` of a choice in the walk. */
export function yesNo() {
  return z.optional(z.union([z.boolean(), z.enum(['yes', 'no'])], { error: 'yes or no' }))
}

/** Reads a `yesNo` value; undefined stays undefined. */
export function isYes(value: boolean | 'yes' | 'no' | undefined): boolean | undefined {
  return value === undefined ? undefined : value === true || value === 'yes'
}

/** A short text as it was read off the part. */
export function printedText(maxLength: number) {
  const error = `at most ${maxLength} characters`
  return z.optional(z.string({ error }).check(z.maxLength(maxLength, { error })))
}
