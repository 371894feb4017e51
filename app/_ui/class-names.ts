/** Joins class names and leaves out what is not there. Later ones do not override earlier ones: CSS order does. */
export function classNames(...names: readonly (string | false | null | undefined)[]): string {
  return names.filter((name) => typeof name === 'string' && name !== '').join(' ')
}
