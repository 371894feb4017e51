import { eq } from 'drizzle-orm'
import { describe, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { AccountActor } from '@/lib/platform/actor'
import { newId } from '@/lib/platform/ids'
import { verifyJws } from '@/lib/platform/jws'
import { isRefusal } from '@/lib/platform/refusal'
import { sha256 } from '@/lib/platform/sha256'
import { chainNext } from '@/lib/sync/core/chain'
import { appendServerRecords, type ServerDraft, type ServerNote } from '@/lib/sync/server/append-server-records'
import { serverDeviceId } from '@/lib/sync/server/server-device'
import { aSyncPaddock, type SyncPaddock } from '../support/sync-paddock'
import { presents, seesAll } from '../support/sync-walk'

function anAccount(paddock: SyncPaddock, roles: readonly ('admin' | 'organiser' | 'entrant')[] = ['organiser']): AccountActor {
  const { clubId } = paddock.database().select().from(tables.event).get() ?? { clubId: '' }
  const accountId = newId()
  const row = { id: accountId, clubId, email: `${accountId}@marram.example`, name: 'The office', passwordHash: 'x', roles, createdAt: 0 }
  paddock.database().insert(tables.account).values(row).run()
  return { kind: 'account', accountId, clubId, name: 'The office', clubRoles: roles, signInHash: '' }
}

function appends(paddock: SyncPaddock, actor: AccountActor, drafts: readonly ServerDraft[], notes: readonly ServerNote[] = []) {
  const made = transaction(paddock.database(), (tx) => appendServerRecords(tx, paddock.event, actor, drafts, paddock.time.now, notes))
  if (isRefusal(made)) throw new Error(`refused: ${made.code}`)
  return made
}

async function aPassedCar() {
  const paddock = await aSyncPaddock()
  const office = anAccount(paddock)
  const bay = await paddock.phone(['scrutineer'])
  const car = paddock.cars[0] as string
  await bay.day.loadDay()
  await presents(bay.day, car)
  await seesAll(bay.day, car)
  await bay.day.issuePass({ entry: car, passengerSeatUsable: false })
  await bay.day.drain()
  return { paddock, office, bay, car }
}

const changed = (car: string, change: Extract<ServerDraft, { kind: 'entry-changed' }>['change']) =>
  ({ kind: 'entry-changed', subject: { car }, change }) as const

describe('records of the server', () => {
  test('[S3] they are numbered, chained and signed by number 0, in the name of the person at the event', async () => {
    const { paddock, office, car } = await aPassedCar()
    const before = paddock.rows().length
    appends(paddock, office, [changed(car, { what: 'number', number: '99' }), changed(car, { what: 'plate', plateTail: 'ZZ99' })])
    const rows = paddock.rows()
    expect(rows.slice(before).map(({ seq, deviceSeq, disposition }) => [seq, deviceSeq, disposition])).toEqual([
      [before + 1, 1, 'accepted'],
      [before + 2, 2, 'accepted'],
    ])
    let chain = ''
    for (const row of rows) {
      chain = chainNext(chain, row.jws, row, sha256)
      expect(row.chain).toBe(chain)
    }
    const device = paddock.database().select().from(tables.device).where(eq(tables.device.kid, 0)).get()
    expect(device?.id).toBe(serverDeviceId(paddock.event))
    const said = verifyJws(rows[before]?.jws ?? '', 'lockwire-record', device?.publicKey ?? '') as { actor: string; shown: object }
    const person = paddock.database().select().from(tables.person).where(eq(tables.person.accountId, office.accountId)).get()
    expect(said.actor).toBe(person?.id)
    expect(said.shown).toEqual({ number: '47', plateTail: '11KLM' })
  })

  test.each([
    [{ what: 'number', number: '99' }, 'dead'],
    [{ what: 'plate', plateTail: 'ZZ99' }, 'dead'],
    [{ what: 'facts' }, 'dead'],
    [{ what: 'withdrawn' }, 'dead'],
    [{ what: 'people', added: [], removed: [], passengers: [] }, 'live'],
  ] as const)('[F7] a pass that does not know the office’s change %o is %s on every device', async (change, state) => {
    const { paddock, office, bay, car } = await aPassedCar()
    appends(paddock, office, [changed(car, change as never)])
    await bay.day.drain()
    expect(bay.day.state(`car:${car}`).passes.map((pass) => pass.state)).toEqual([state])
  })

  test('[F7] a pass issued after the change knows it and lives', async () => {
    const { paddock, office, bay, car } = await aPassedCar()
    appends(paddock, office, [changed(car, { what: 'number', number: '99' })])
    await bay.day.drain()
    await bay.day.issuePass({ entry: car, passengerSeatUsable: false })
    await bay.day.drain()
    expect(bay.day.state(`car:${car}`).passes.map((pass) => pass.state)).toEqual(['dead', 'live'])
    expect(bay.day.entries().find(({ id }) => id === car)?.number).toBe('99')
  })

  test('a return names the withdrawals in force and ends them', async () => {
    const { paddock, office, bay, car } = await aPassedCar()
    appends(paddock, office, [changed(car, { what: 'withdrawn' })])
    appends(paddock, office, [changed(car, { what: 'returned' })])
    await bay.day.drain()
    expect(bay.day.state(`car:${car}`).verdict).toBe('passed')
  })

  test('a void stops, and a note travels with what names it', async () => {
    const { paddock, office, bay, car } = await aPassedCar()
    const pass = bay.day.state(`car:${car}`).passes[0]?.hash ?? ''
    const incident = { kind: 'comment', subject: { car }, notes: ['note:why'] } as const
    appends(
      paddock,
      office,
      [
        { kind: 'void', subject: { car }, voids: pass, reason: 'Two stickers out' },
        { ...incident, notes: [...incident.notes] },
      ],
      [{ ref: 'why', text: 'The second label went astray' }],
    )
    await bay.day.drain()
    expect(bay.day.state(`car:${car}`).passes.map(({ state }) => state)).toEqual(['dead'])
    expect(paddock.database().select().from(tables.note).all()).toMatchObject([
      { text: 'The second label went astray', seq: paddock.rows().length },
    ])
  })

  test('whoever may not make such a record is refused, and nothing of it is kept', async () => {
    const { paddock, car } = await aPassedCar()
    const before = paddock.rows().length
    const entrant = anAccount(paddock, ['entrant'])
    const made = transaction(paddock.database(), (tx) =>
      appendServerRecords(tx, paddock.event, entrant, [changed(car, { what: 'facts' })], 0),
    )
    expect(isRefusal(made) && made.code).toBe('forbidden')
    const foreign = { ...anAccount(paddock), clubId: newId() }
    const abroad = transaction(paddock.database(), (tx) =>
      appendServerRecords(tx, paddock.event, foreign, [changed(car, { what: 'facts' })], 0),
    )
    expect(isRefusal(abroad) && abroad.code).toBe('missing')
    expect(paddock.rows()).toHaveLength(before)
  })

  test('a transaction that fails after it leaves neither record nor memory of it', async () => {
    const { paddock, office, bay, car } = await aPassedCar()
    const before = paddock.rows().length
    expect(() =>
      transaction(paddock.database(), (tx) => {
        appendServerRecords(tx, paddock.event, office, [changed(car, { what: 'number', number: '12' })], paddock.time.now)
        throw new Error('no room')
      }),
    ).toThrow('no room')
    expect(paddock.rows()).toHaveLength(before)
    appends(paddock, office, [changed(car, { what: 'number', number: '13' })])
    await bay.day.drain()
    expect(bay.day.entries().find(({ id }) => id === car)?.number).toBe('13')
    expect(bay.day.log(`car:${car}`)).toHaveLength(before + 1)
  })

  test('[S4] a restored server takes its own forgotten records back from a device', async () => {
    const { paddock, office, bay, car } = await aPassedCar()
    appends(paddock, office, [changed(car, { what: 'group', group: newId() })])
    const copy = paddock.backUp()
    appends(paddock, office, [changed(car, { what: 'withdrawn' })])
    await bay.day.drain()
    const all = paddock.rows().length
    paddock.restore(copy)
    await bay.day.drain()
    await bay.day.drain()
    expect(paddock.rows()).toHaveLength(all)
    expect(bay.day.state(`car:${car}`).verdict).toBe('withdrawn')
  })

  test('[M2] a server whose copy knew of no record of its own takes them back by its certificate', async () => {
    const { paddock, office, bay, car } = await aPassedCar()
    const copy = paddock.backUp()
    appends(paddock, office, [changed(car, { what: 'withdrawn' })])
    await bay.day.drain()
    paddock.restore(copy)
    await bay.day.drain()
    await bay.day.drain()
    expect(bay.day.state(`car:${car}`).verdict).toBe('withdrawn')
    const row = paddock.database().select().from(tables.device).where(eq(tables.device.kid, 0)).get()
    expect(row?.id).toBe(serverDeviceId(paddock.event))
  })
})
