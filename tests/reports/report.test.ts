import { expect, test } from 'vitest'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { REPORT_HEAD, reportLines } from '@/lib/reports/report-lines'
import type { ReportedRecord } from '@/lib/reports/reported-log'
import { stationCounts } from '@/lib/reports/station-counts'
import { allOk, CREW, finding, hold, presented } from '../support/paddock'
import { paddockBook } from '../support/paddock-book'

function theBook() {
  const made = paddockBook()
  if (made === null) throw new Error('the paddock has no book')
  return made
}

const book = theBook()
const words = { timeZone: 'Europe/London', people: new Map([[CREW.asha, 'Tobin Ashe']]), devices: new Map<string, string>(), book }

function logOf(entries: readonly LogEntry[]): readonly ReportedRecord[] {
  return entries.map(({ record, hash, disposition }, index) => ({
    seq: index + 1,
    jws: 'a.b.c',
    hash,
    chain: 'c'.repeat(64),
    disposition: disposition.state === 'quarantined' ? 'quarantined' : 'accepted',
    code: disposition.state === 'quarantined' ? 'wrong-role' : null,
    receivedAt: 0,
    record,
  }))
}

/** One line as an object by its headings. */
function line(entry: LogEntry): Readonly<Record<string, string | number>> {
  const [, cells = []] = reportLines(logOf([entry]), words)
  return Object.fromEntries(REPORT_HEAD.map((head, index) => [head, cells[index] ?? '']))
}

test('a look says who saw what, at which check, with which outcome, and that it counts', () => {
  const [look] = allOk()
  if (!look) throw new Error('no look')
  expect(line(look)).toMatchObject({ About: 'car', What: 'finding', Outcome: 'ok', By: 'Tobin Ashe', Counts: 'yes' })
  expect(line(look).Check).not.toBe('')
  expect(line(look).Station).not.toBe('')
})

test('what was set aside stands in the report with its reason, and counts for nothing', () => {
  const look = { ...finding('seat.mounts', 'ok'), disposition: { state: 'quarantined', code: 'wrong-role' } } as LogEntry
  expect(line(look).Counts).toBe('set aside: wrong-role')
  expect(stationCounts(logOf([look]), book).every(({ ok }) => ok === 0)).toBe(true)
})

test('a hold stands with its reason in words, a presented with what it pins', () => {
  expect(line(hold({})).What).toBe('hold')
  expect(String(line(presented())['Why, and by which figures'])).toMatch(/^depth [a-z-]+; checklist [0-9a-z]/)
})

test('stations count looks and those who were looked at; what was taken back is no look', () => {
  const log = logOf([presented(), ...allOk(), finding('seat.mounts', 'fail'), finding('seat.mounts', 'unseen')])
  const looks = log.filter(({ record }) => record.kind === 'finding').length
  const counts = stationCounts(log, book)
  expect(counts.reduce((sum, { ok, fail }) => sum + ok + fail, 0)).toBe(looks - 1)
  expect(counts.find(({ fail }) => fail > 0)).toMatchObject({ fail: 1, subjects: 1 })
})
