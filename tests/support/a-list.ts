import { readFileSync } from 'node:fs'
import type { EntryColumn } from '@/lib/entries/entry-columns'
import type { ListAnswer } from '@/lib/entries/list-question'
import type { ExistingEntry } from '@/lib/entries/plan-import'
import { planList } from '@/lib/entries/plan-list'
import { NO_CHOICES, readEntryList, type ListChoices } from '@/lib/entries/read-entry-list'

export const HEAD = 'Entry No,First name,Surname,E-mail,Mobile,Car,Colour,Reg,Group,Passengers,Notes'
export const GROUPS = ['Novice', 'Intermediate', 'Advanced']

/** A line of a list in the columns of `HEAD`, sound but for what is said. */
export function aLine(said: Partial<Record<EntryColumn, string>> = {}): string {
  const cells = { number: '7', firstName: 'Ada', surname: 'Norcott', email: 'ada@example.org', mobile: '', model: 'Tessier Petite', colour: 'Red', plate: 'gf90 vgn', group: 'Novice', passengerSeats: '1', note: 'quiet', ...said } // prettier-ignore
  return [cells.number, cells.firstName, cells.surname, cells.email, cells.mobile, cells.model, cells.colour, cells.plate, cells.group, cells.passengerSeats, cells.note].join(',') // prettier-ignore
}

export function aList(...lines: readonly string[]): Uint8Array {
  return new TextEncoder().encode([HEAD, ...lines].join('\n'))
}

export function fixture(name: string): Uint8Array {
  return new Uint8Array(readFileSync(`tests/fixtures/${name}.csv`))
}

interface Given {
  readonly choices?: Partial<ListChoices>
  readonly answers?: Readonly<Record<string, string>>
  readonly groups?: readonly string[]
  readonly existing?: readonly ExistingEntry[]
}

/** Reads a list and plans it as the import does. An answer is `value` or `value:text`. */
export function planned(bytes: Uint8Array, { choices = {}, answers = {}, groups = GROUPS, existing = [] }: Given = {}) {
  const list = readEntryList(bytes, { ...NO_CHOICES, ...choices })
  const said = Object.entries(answers).map(([id, answer]): ListAnswer => {
    const [value = '', text = ''] = answer.split(/=(.*)/)
    return { id, value, text }
  })
  return { list, ...planList(list, groups, existing, said) }
}
