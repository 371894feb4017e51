import 'server-only'
import { and, eq } from 'drizzle-orm'
import { car, kit } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { addCar, addKit, keepCar, keepKit } from '@/lib/contracts/my-garage'
import type { Command } from '@/lib/platform/command'
import { newId } from '@/lib/platform/ids'
import { refuse } from '@/lib/platform/refusal'

/** Adds a car of one’s own; the same car added twice is the one that is there. */
export const addMyCar: Command<typeof addCar> = ({ body }, { accountId, clubId }, { database }) =>
  transaction(database, (tx) => {
    const plate = body.plate.toUpperCase().replace(/[^\p{L}\p{N}]/gu, '')
    const same = and(eq(car.clubId, clubId), eq(car.plate, plate), eq(car.model, body.model), eq(car.colour, body.colour))
    const known = tx
      .select()
      .from(car)
      .where(same)
      .all()
      .find(({ ownerAccountId }) => ownerAccountId === accountId)
    if (known) return { id: known.id }
    const id = newId()
    tx.insert(car).values({ id, clubId, model: body.model, colour: body.colour, plate, ownerAccountId: accountId, facts: body.facts }).run()
    return { id }
  })

/** Keeps what is known of a car of one's own for next time. */
export const keepMyCar: Command<typeof keepCar> = ({ params, body }, { accountId, clubId }, { database }) => {
  const mine = and(eq(car.id, params.car), eq(car.clubId, clubId), eq(car.ownerAccountId, accountId))
  const { changes } = database.update(car).set({ facts: body.facts }).where(mine).run()
  return changes === 0 ? refuse('missing') : { id: params.car }
}

/** Adds a piece of kit of one's own. */
export const addMyKit: Command<typeof addKit> = ({ body }, { accountId, clubId }, { database, now }) => {
  const id = newId()
  database
    .insert(kit)
    .values({ ...body, id, clubId, accountId, updatedAt: now })
    .run()
  return { id }
}

/** Changes a piece of one's own kit, or puts it away. */
export const keepMyKit: Command<typeof keepKit> = ({ params, body }, { accountId, clubId }, { database, now }) => {
  const mine = and(eq(kit.id, params.kit), eq(kit.clubId, clubId), eq(kit.accountId, accountId))
  const { changes } = database
    .update(kit)
    .set({ ...body, updatedAt: now })
    .where(mine)
    .run()
  return changes === 0 ? refuse('missing') : { id: params.kit }
}
