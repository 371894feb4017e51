import type { BookCheck } from '@/lib/checklist/book'
import { plateTail } from '@/lib/pass/plate-tail'
import { RECORD_TYPE } from '@/lib/sync/core/record-type'
import { newId } from '@/lib/platform/ids'
import type { BenchTablet } from './bench-tablet'

/** The signed records of walking car after car: a `presented`, then an ok on each check that is not measured. Cut into batches of `size`. */
export function walkBatches(tablet: BenchTablet, count: number, size: number): readonly (readonly string[])[] {
  const checks = tablet.book.checks.filter((check) => check.subject === 'car' && check.rule === undefined && check.measure === undefined)
  const records: string[] = []
  for (const entry of tablet.entries) {
    const write = (fields: object) => {
      records.push(tablet.sign({ ...envelope(tablet, records.length + 1, entry), ...fields }, RECORD_TYPE))
    }
    write(presented(tablet, entry.facts))
    for (const check of checks) write(looksGood(check))
  }
  if (records.length < count * size)
    throw new Error(`only ${String(records.length)} records could be made for ${String(count)} batches of ${String(size)}`)
  return Array.from({ length: count }, (_, index) => records.slice(index * size, (index + 1) * size))
}

function envelope(tablet: BenchTablet, deviceSeq: number, entry: BenchTablet['entries'][number]) {
  return {
    v: 1,
    id: newId(),
    event: tablet.event.id,
    subject: { car: entry.id },
    device: tablet.id,
    deviceSeq,
    actor: tablet.actor,
    at: Date.now(),
    offset: 0,
    day: tablet.event.firstDay,
    seen: 0,
    basis: [],
    answers: [],
    shown: { number: entry.number, plateTail: plateTail(entry.plate) },
  }
}

function presented(tablet: BenchTablet, facts: BenchTablet['entries'][number]['facts']) {
  const { checklistHash, limitsHash } = tablet.event
  return { kind: 'presented', effect: 'none', checklist: checklistHash, limits: limitsHash, declaration: null, facts, depth: 'standard' }
}

function looksGood(check: BookCheck) {
  return { kind: 'finding', effect: 'permits', check: check.id, outcome: 'ok' }
}
