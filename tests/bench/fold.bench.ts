import { foldEvent } from '@/lib/inspection/fold-event'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { context, finding, presented } from '../support/paddock'
import { fakeId } from '../support/paddock-hash'
import { benchBook } from './bench-book'
import { median, row, timed } from './row'

const ENTRIES = 300
const FINDINGS = 60
const AIM_MS = 150

const book = benchBook()
const log = Array.from({ length: ENTRIES }, (_, index) => aWalkedCar(index)).flat()
const told = context({ openBook: () => book })

const times = timed(() => foldEvent(log, told), 9, 3)
const ms = median(times)
row({
  what: `fold ${ENTRIES} entries × ${FINDINGS} findings (${log.length} records)`,
  value: `${ms.toFixed(1)} ms`,
  aim: `≤ ${AIM_MS} ms`,
  met: ms <= AIM_MS,
})
row({ what: 'fold one of these entries', value: `${((ms / ENTRIES) * 1000).toFixed(0)} µs` })

/** One car with sixty findings: every check of the book in turn, then again from the start naming the look before; one in twenty fails first. */
function aWalkedCar(index: number): readonly LogEntry[] {
  const subject = { car: fakeId(`bench entry ${String(index)}`) }
  const checks = book.checks.filter((check) => check.subject === 'car')
  const last = new Map<string, LogEntry>()
  const entries = [presented({ subject, checklist: book.checklistHash, limits: book.limitsHash, facts: {} })]
  for (let made = 0; made < FINDINGS; made++) {
    const check = checks[made % checks.length]
    if (check === undefined) throw new Error('the book has no checks of a car')
    const before = last.get(check.id)
    const outcome = before === undefined && (index + made) % 20 === 0 ? 'fail' : 'ok'
    const entry = finding(check.id, outcome, {
      subject,
      basis: before === undefined ? [] : [before],
      paramsHash: check.paramsHash,
      measured: { value: 1 },
    })
    last.set(check.id, entry)
    entries.push(entry)
  }
  return entries
}
