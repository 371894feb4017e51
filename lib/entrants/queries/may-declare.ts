import 'server-only'
import type { Db } from '@/db/client'
import type { Book } from '@/lib/checklist/book'
import type { BookCheck } from '@/lib/checklist/book'
import type { FactDefinition } from '@/lib/checklist/checklist'
import { askedAtHome } from '@/lib/checklist/declarable'
import type { AccountActor } from '@/lib/platform/actor'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import type { ReadDay } from '../read-day'
import { isMyDrive, myEntryRow, type MyEntryRow } from './my-entry-row'

export interface MayDeclare {
  readonly row: MyEntryRow
  readonly facts: readonly FactDefinition[]
  readonly checks: readonly BookCheck[]
  /** Whose kit this account declares. */
  readonly people: readonly { readonly id: string; readonly name: string }[]
  /** Drivers whose kit somebody else declares. */
  readonly others: readonly string[]
  /** Somebody has begun to look at the car. */
  readonly isPresented: boolean
}

/** An entry that this account may declare now, with what its checklist asks at home. A foreign one is missing. */
export function mayDeclare(readDay: ReadDay, database: Db, actor: AccountActor, entryId: string, now: number): MayDeclare | Refusal {
  const row = myEntryRow(database, actor, entryId)
  if (row === null) return refuse('missing')
  if (!isMyDrive(row)) return refuse('forbidden')
  const reading = readDay(database, row.event.id, now)
  const book = reading?.bookOf(row.event.checklistHash, row.event.limitsHash)
  if (!reading || !book) return refuse('missing')
  const state = reading.stateOf(`car:${row.entry.id}`)
  if (reading.day > row.event.lastDay || row.entry.withdrawn || state.withdrawn) return refuse('declaration-closed')
  const drivers = row.people.filter(({ role }) => role === 'driver')
  return {
    row,
    ...atHome(book),
    people: drivers.filter(({ isMe }) => isMe).map(({ id, name }) => ({ id, name })),
    others: drivers.filter(({ isMe }) => !isMe).map(({ id }) => id),
    isPresented: state.presentedHeads.length > 0,
  }
}

/** What a book asks an entrant: the facts of a car, and the checks that can be answered at home. */
export function atHome(book: Book): Pick<MayDeclare, 'facts' | 'checks'> {
  return {
    facts: book.checklist.facts.filter(({ subject }) => subject === 'car'),
    checks: book.checks.filter((check) => check.subject !== 'fit' && askedAtHome(check) !== null),
  }
}
