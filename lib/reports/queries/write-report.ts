import 'server-only'
import { eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { checklistText, device, type event, limitsText, note, person } from '@/db/schema'
import type { Book } from '@/lib/checklist/book'
import type { reportCsv, reportJson } from '@/lib/contracts/report'
import type { DownloadCommand } from '@/lib/platform/command'
import { csvText } from '@/lib/platform/csv-text'
import { ownEvent } from '@/lib/platform/own-event'
import { refuse } from '@/lib/platform/refusal'
import { serverPublicKey } from '@/lib/platform/server-key'
import { reportLines } from '../report-lines'
import type { ReportedRecord, ReportWords } from '../reported-log'

type EventRow = typeof event.$inferSelect

/** How the log is read: the sync's own reading, which the route hands in. */
export interface ReadReport {
  readonly logOf: (database: Db, eventId: string) => readonly ReportedRecord[]
  readonly bookOf: (database: Db, checklistHash: string, limitsHash: string) => Book | null
}

/** The log in words as CSV, for a spreadsheet. */
export function writeReportCsv(read: ReadReport): DownloadCommand<typeof reportCsv> {
  return ({ params }, actor, { database }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own) return refuse('missing')
    const text = csvText(reportLines(read.logOf(database, own.id), wordsOf(database, own, read)))
    return { bytes: Buffer.from(text, 'utf8'), type: 'text/csv; charset=utf-8', saveAs: fileName(own, 'csv'), etag: null }
  }
}

/** The log as it was signed, byte for byte, with the keys, names and texts that are needed to check and to read it. */
export function writeReportJson(read: ReadReport): DownloadCommand<typeof reportJson> {
  return ({ params }, actor, { database, now }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own) return refuse('missing')
    const text = JSON.stringify(exportOf(database, own, read.logOf(database, own.id), now), null, 1)
    return { bytes: Buffer.from(text, 'utf8'), type: 'application/json', saveAs: fileName(own, 'json'), etag: null }
  }
}

/** Names of people and devices, and the book in force: what turns the log into words. */
export function wordsOf(database: Db, own: EventRow, read: ReadReport): ReportWords {
  const people = database.select({ id: person.id, name: person.name }).from(person).where(eq(person.eventId, own.id)).all()
  const devices = database.select({ id: device.id, name: device.name }).from(device).where(eq(device.eventId, own.id)).all()
  return {
    timeZone: own.timeZone,
    people: new Map(people.map(({ id, name }) => [id, name])),
    devices: new Map(devices.map(({ id, name }) => [id, name])),
    book: read.bookOf(database, own.checklistHash, own.limitsHash),
  }
}

function exportOf(database: Db, own: EventRow, log: readonly ReportedRecord[], now: number) {
  const { id, name, venue, timeZone, firstDay, lastDay, checklistHash, limitsHash } = own
  return {
    what: 'Lockwire event log, version 1',
    says: 'Each record is signed by a device and attributed to the person unlocked on it. The chain shows that none was taken out or changed since.',
    exportedAt: new Date(now).toISOString(),
    event: { id, name, venue, timeZone, firstDay, lastDay, checklistHash, limitsHash },
    serverKey: serverPublicKey(database, own.clubId),
    certificates: database
      .select({ certificate: device.certificate })
      .from(device)
      .where(eq(device.eventId, id))
      .all()
      .map((row) => row.certificate),
    people: database.select({ id: person.id, name: person.name }).from(person).where(eq(person.eventId, id)).all(),
    checklist: textOf(database.select({ body: checklistText.body }).from(checklistText).where(eq(checklistText.hash, checklistHash)).get()),
    limits: textOf(database.select({ body: limitsText.body }).from(limitsText).where(eq(limitsText.hash, limitsHash)).get()),
    notes: database.select({ hash: note.hash, salt: note.salt, text: note.text }).from(note).where(eq(note.eventId, id)).all(),
    records: log.map(({ record: _, ...row }) => row),
  }
}

/** The text itself and not its JSON: its hash is over these bytes. */
function textOf(row: { readonly body: string } | undefined): string | null {
  return row?.body ?? null
}

function fileName({ name, firstDay }: EventRow, ending: string): string {
  return `${name.replaceAll(/[^\p{L}\p{N}]+/gu, '-')}-${firstDay}.${ending}`
}
