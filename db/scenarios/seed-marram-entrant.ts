import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, car, entry, kit } from '@/db/schema'
import { transaction } from '@/db/transaction'
import { newId } from '@/lib/platform/ids'
import { demoEmail, MARRAM } from './marram'
import type { SeededMarram } from './seed-marram'

/**
 * The demo's entrant: the car of their entry with what is kept of it from last season, belts one year out of date among it, and a helmet.
 * What they have changed since is left as it is.
 */
export function seedMarramEntrant(database: Db, { clubId, eventId, firstDay }: SeededMarram, now: number): void {
  transaction(database, (tx) => {
    const owner = tx
      .select({ id: account.id })
      .from(account)
      .where(eq(account.email, demoEmail('entrant')))
      .get()
    const own = tx
      .select({ carId: entry.carId })
      .from(entry)
      .where(and(eq(entry.eventId, eventId), eq(entry.number, MARRAM.entrantNumber)))
      .get()
    if (!owner || !own) throw new Error('the demo’s entrant has no account, or no entry on its list')
    const held = tx.select({ ownerAccountId: car.ownerAccountId }).from(car).where(eq(car.id, own.carId)).get()
    if (held?.ownerAccountId !== null) return
    const year = Number(firstDay.slice(0, 4))
    const week = `18${String(year - 3).slice(2)}`
    const tyres = ['front-left', 'front-right', 'rear-right', 'rear-left'].map(
      (place) => [`tyres.date-code.${place}/dateCode`, week] as const,
    )
    const facts = {
      belts: 'harness',
      headRestraint: false,
      shoulderAnchor: 'bolted',
      roof: 'closed',
      tyres: 'semi-slick',
      passengerSeat: 'not',
      spacers: false,
      cooling: 'water',
      'harness.label/standard': 'fia-8853-2016',
      'harness.label/labelYear': year - 1,
      'harness.label/labelsComplete': 'yes',
      'harness.label/labelsSameNumber': 'yes',
      ...Object.fromEntries(tyres),
    }
    tx.update(car).set({ ownerAccountId: owner.id, facts }).where(eq(car.id, own.carId)).run()
    const values = { label: 'snell-sa2020', secondLabel: 'none', face: 'full', madeYear: year - 3, madeMonth: 5, impact: 'no' }
    const helmet = { clubId, accountId: owner.id, kind: 'helmet', name: 'White full face', values, updatedAt: now } as const
    tx.insert(kit)
      .values({ ...helmet, id: newId() })
      .run()
  })
}
