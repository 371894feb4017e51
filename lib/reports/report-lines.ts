import { holdWords } from '@/lib/checklist/resolve-hold'
import { isKnown, type AnyRecord, type KnownRecord } from '@/lib/inspection/record'
import { subjectKind } from '@/lib/inspection/subject'
import { explainJudgement } from '@/lib/rules/explain'
import { venueClock } from '@/lib/rules/venue-clock'
import type { ReportedRecord, ReportWords } from './reported-log'

export const REPORT_HEAD = [
  'No',
  'Venue day',
  'Time',
  'Number',
  'Plate ends',
  'About',
  'Person',
  'What',
  'Station',
  'Check',
  'Outcome',
  'Why, and by which figures',
  'Put right here, from',
  'By',
  'Written by',
  'Signed by device',
  'Counts',
] as const

/** One line a record, in the order of the log: who said what of whom, by which figures, signed by which device. */
export function reportLines(log: readonly ReportedRecord[], words: ReportWords): readonly (readonly (string | number)[])[] {
  return [REPORT_HEAD, ...log.map((one) => lineOf(one, words))]
}

function lineOf({ seq, record, disposition, code }: ReportedRecord, words: ReportWords): readonly (string | number)[] {
  const known = isKnown(record) ? record : null
  const name = (id: string | undefined) => (id === undefined ? '' : (words.people.get(id) ?? id))
  const { subject } = record
  const check = checkOf(record, words)
  return [
    seq,
    record.day,
    venueClock(record.at + (known?.offset ?? 0), words.timeZone),
    known?.shown.number ?? '',
    known?.shown.plateTail ?? '',
    subjectKind(subject),
    'person' in subject ? name(subject.person) : '',
    record.kind,
    check === null ? '' : (words.book?.stations.get(check.station)?.title ?? check.station),
    check?.prompt ?? '',
    known !== null && 'outcome' in known ? known.outcome : '',
    known === null ? 'a kind this version does not know' : whyWords(known, words),
    known?.kind === 'finding' && known.found ? `${known.found.outcome}${reasonOf(known.found.reason, check)}` : '',
    name(record.actor),
    name(known?.writtenBy),
    words.devices.get(record.device) ?? record.device,
    disposition === 'accepted' ? 'yes' : `set aside: ${code ?? 'no reason'}`,
  ]
}

function checkOf(record: AnyRecord, { book }: ReportWords) {
  return isKnown(record) && 'check' in record ? (book?.byId.get(record.check) ?? null) : null
}

function reasonOf(reason: string | null | undefined, check: ReturnType<typeof checkOf>): string {
  if (reason === null || reason === undefined) return ''
  return `: ${check?.reasons.find(({ id }) => id === reason)?.text ?? reason}`
}

function whyWords(record: KnownRecord, words: ReportWords): string {
  const check = checkOf(record, words)
  switch (record.kind) {
    case 'finding':
      return [
        reasonOf(record.reason, check).slice(2),
        record.judgement ? explainJudgement(record.judgement.code, record.judgement.facts) : figures(record.measured),
        record.carriedFrom ? 'carried forward, not looked at' : '',
        record.paper ? `from a paper card, seen by ${words.people.get(record.paper.seenBy) ?? record.paper.seenBy}` : '',
      ]
        .filter((part) => part !== '')
        .join('; ')
    case 'hold':
      return holdWords(record.reason, words.book)
    case 'dispensation':
      return `${record.reason}; on condition: ${record.conditions}; until ${record.until ?? 'the event’s end'}`
    case 'ruling':
    case 'lifted':
    case 'adopted':
      return record.why
    case 'void':
      return record.reason
    case 'presented':
      return `depth ${record.depth}; checklist ${record.checklist.slice(0, 12)}, limits ${record.limits.slice(0, 12)}; ${figures(record.facts)}`
    case 'band':
      return `band ${record.bandNumber}`
    default:
      return ''
  }
}

function figures(values: Readonly<Record<string, string | number | boolean | null>> | undefined): string {
  return Object.entries(values ?? {})
    .map(([name, value]) => `${name} ${String(value)}`)
    .join(', ')
}
