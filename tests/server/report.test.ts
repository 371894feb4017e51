import { createHash } from 'node:crypto'
import { expect, test } from 'vitest'
import * as tables from '@/db/schema'
import type { AccountActor } from '@/lib/platform/actor'
import { newId } from '@/lib/platform/ids'
import { isRefusal } from '@/lib/platform/refusal'
import { readReport } from '@/app/(organiser)/_frame/read-report'
import { writeReportCsv, writeReportJson } from '@/lib/reports/queries/write-report'
import { aSyncPaddock, type SyncPaddock } from '../support/sync-paddock'
import { finds, presents, seesAll } from '../support/sync-walk'

function organiser(paddock: SyncPaddock, clubId?: string): AccountActor {
  const own = paddock.database().select().from(tables.event).get()?.clubId ?? ''
  return { kind: 'account', accountId: newId(), clubId: clubId ?? own, name: 'Dorian Marsh', clubRoles: ['organiser'], signInHash: '' }
}

async function written(write: typeof writeReportCsv | typeof writeReportJson, paddock: SyncPaddock, actor = organiser(paddock)) {
  const deps = { database: paddock.database(), now: paddock.time.now } as never
  const file = await write(readReport)({ params: { event: paddock.event }, query: {}, body: {} }, actor, deps)
  return isRefusal(file) ? file.code : Buffer.from(file.bytes).toString('utf8')
}

async function aMorning() {
  const paddock = await aSyncPaddock({ cars: 2 })
  const bay = await paddock.phone(['scrutineer'])
  await bay.day.loadDay()
  const [first, second] = paddock.cars as [string, string]
  await presents(bay.day, first)
  await seesAll(bay.day, first)
  await presents(bay.day, second)
  await finds(bay.day, second, 'seat.mounts', 'fail', { reason: 'other' })
  await bay.day.drain()
  return paddock
}

test('the JSON holds every record byte for byte, and whoever has it can follow the chain', async () => {
  const paddock = await aMorning()
  const said = JSON.parse(await written(writeReportJson, paddock)) as {
    records: { seq: number; jws: string; hash: string; chain: string }[]
    certificates: string[]
  }
  expect(said.records.map(({ jws }) => jws)).toEqual(paddock.rows().map(({ jws }) => jws))
  expect(said.records.every(({ jws, hash }) => createHash('sha256').update(jws).digest('hex') === hash)).toBe(true)
  expect(said.records.map(({ seq }) => seq)).toEqual(said.records.map((_, index) => index + 1))
  expect(said.certificates.length).toBeGreaterThan(0)
})

test('the CSV has a line for each record, with the number that was shown', async () => {
  const paddock = await aMorning()
  const lines = (await written(writeReportCsv, paddock)).trim().split('\r\n')
  expect(lines).toHaveLength(paddock.rows().length + 1)
  expect(lines.filter((each) => each.includes(',fail,'))).toHaveLength(1)
  expect(lines.at(-1)).toContain(',48,')
})

test('another club’s event is as one that never was', async () => {
  const paddock = await aMorning()
  expect(await written(writeReportJson, paddock, organiser(paddock, newId()))).toBe('missing')
  expect(await written(writeReportCsv, paddock, organiser(paddock, newId()))).toBe('missing')
})
