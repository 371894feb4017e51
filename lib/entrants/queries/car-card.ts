import 'server-only'
import type { Db } from '@/db/client'
import type { BookCheck } from '@/lib/checklist/book'
import type { FactDefinition } from '@/lib/checklist/checklist'
import { isKeptForNextTime } from '@/lib/checklist/declarable'
import { type DeclarationParts, NOTHING_DECLARED } from '@/lib/contracts/declaration'
import type { AccountActor } from '@/lib/platform/actor'
import { partsKept } from '../kept-parts'
import type { ReadDay } from '../read-day'
import { atHome } from './may-declare'
import { garageBook, myCar, type MyCar } from './my-garage'

export interface CarCard {
  readonly car: MyCar
  readonly facts: readonly FactDefinition[]
  /** What is kept for next time: labels and dates, nothing that wears within a day. */
  readonly checks: readonly BookCheck[]
  readonly places: readonly { readonly id: string; readonly title: string }[]
  readonly kept: DeclarationParts
  /** Whose rules judge it here, and on which day; null where the club has no event. */
  readonly judgedFor: { readonly event: string; readonly lastDay: string } | null
}

/** A car of one's own with what is kept of it; null for anybody else's. */
export function carCard(readDay: ReadDay, database: Db, actor: AccountActor, carId: string, now: number): CarCard | null {
  const car = myCar(database, actor, carId)
  if (car === null) return null
  const garage = garageBook(readDay, database, actor, now)
  if (garage === null) return { car, facts: [], checks: [], places: [], kept: NOTHING_DECLARED, judgedFor: null }
  const { facts, checks } = atHome(garage.book)
  const ofCar = checks.filter((check) => check.subject === 'car' && check.measure !== undefined && isKeptForNextTime(check))
  return {
    car,
    facts,
    checks: ofCar,
    places: garage.book.checklist.places.map(({ id, title }) => ({ id, title })),
    kept: partsKept(car.facts, facts, ofCar),
    judgedFor: { event: garage.event, lastDay: garage.lastDay },
  }
}
