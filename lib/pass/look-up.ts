import type { ListedEntry, ListedPass, PassList } from './pass-list'

/** A number as it is compared: `47 a` is `47A`, but `007` is not `7`. */
export function sameNumber(one: string, other: string): boolean {
  return bare(one) === bare(other)
}

function bare(number: string): string {
  return number.replace(/\s/g, '').toUpperCase()
}

/** The entries of the list with this number (rule P7): more than one where a number was changed to another car's. */
export function lookUpByNumber(list: PassList, number: string): readonly ListedEntry[] {
  return bare(number) === '' ? [] : list.entries.filter((entry) => sameNumber(entry.number, number))
}

/** The passes of the list with this typed code, dead ones too (rule P7). */
export function lookUpByTypedCode(list: PassList, code: string): readonly { readonly entry: ListedEntry; readonly pass: ListedPass }[] {
  return list.entries.flatMap((entry) => entry.passes.filter((pass) => pass.typedCode === code).map((pass) => ({ entry, pass })))
}
