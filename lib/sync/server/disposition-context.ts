import 'server-only'
import type { Db } from '@/db/client'
import { judgeCheck } from '@/lib/checklist/judge-check'
import { isKnown, type AnyRecord, type RecordOf } from '@/lib/inspection/record'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import type { DeviceActor } from '@/lib/platform/actor'
import type { JudgementOutcome } from '@/lib/rules/judgement'
import { civilDate } from '@/lib/rules/civil-date'
import type { DispositionContext } from '../core/decide-disposition'
import { entryNow } from '../core/entry-now'
import type { EventFrame } from './event-frame'
import type { EventLog } from './event-log'
import { pinnedBook } from './pinned-books'

const WORST: readonly JudgementOutcome[] = ['ok', 'advisory', 'undecided', 'fail']

/** What decides a record's disposition, as the log before it leaves it. Everything dear is worked out only when asked for. */
export function dispositionContext(
  database: Db,
  frame: EventFrame,
  log: EventLog,
  record: AnyRecord,
  device: DeviceActor | null,
): DispositionContext {
  const key = subjectKey(record.subject)
  return {
    enrolled: device !== null,
    device: {
      state: device?.state ?? 'active',
      lastGoodSeq: device?.lastGoodSeq ?? null,
      people: device?.people.map(({ personId }) => personId) ?? [],
    },
    actorRoles: device?.people.find(({ personId }) => personId === record.actor)?.roles ?? [],
    shown: shownOf(frame, log, record),
    get presentedHeads() {
      return presentedHeads(log, key)
    },
    makerOf: (hash) => {
      const entry = log.byHash.get(hash)
      return entry !== undefined && subjectKey(entry.record.subject) === key ? entry.record.actor : null
    },
    judge: (finding) => judgeByRule(database, frame, finding, presentedHeads(log, key)),
    failsByRule: (hash) => {
      const named = log.byHash.get(hash)?.record
      if (named === undefined || !isKnown(named) || named.kind !== 'finding') return false
      return judgeByRule(database, frame, named, presentedHeads(log, key)) === 'fail'
    },
  }
}

/** Number and plate tail of the subject's car as the records so far leave them; null where it has none. */
export function shownOf(frame: EventFrame, log: EventLog, { subject }: Pick<AnyRecord, 'subject'>): DispositionContext['shown'] {
  const id = 'car' in subject ? subject.car : 'fit' in subject ? subject.fit : null
  const entry = id === null ? undefined : frame.entries.get(id)
  if (id === null || entry === undefined) return null
  return entryNow(entry, log.changes.get(subjectKey({ car: id })) ?? [])
}

function presentedHeads(log: EventLog, key: SubjectKey): readonly RecordOf<'presented'>[] {
  const believed = log.presented.get(key) ?? []
  const replaced = new Set(believed.flatMap(({ record }) => record.basis))
  return believed.filter(({ hash }) => !replaced.has(hash)).map(({ record }) => record)
}

/** What the check's rule says under the pins in force whose limits the finding was judged under; under all of them where it fits none. The worst counts. */
function judgeByRule(
  database: Db,
  frame: EventFrame,
  finding: RecordOf<'finding'>,
  heads: readonly RecordOf<'presented'>[],
): JudgementOutcome | null {
  const candidates = heads.flatMap((head) => {
    const check = pinnedBook(database, head.checklist, head.limits)?.byId.get(finding.check)
    return check?.rule === undefined ? [] : [{ check, facts: head.facts }]
  })
  const fitting = candidates.filter(({ check }) => check.paramsHash === finding.paramsHash)
  let worst = -1
  for (const { check, facts } of fitting.length > 0 ? fitting : candidates) {
    const judgement = judgeCheck(check, finding.measured, facts, civilDate(frame.event.lastDay))
    if (judgement !== null) worst = Math.max(worst, WORST.indexOf(judgement.outcome))
  }
  return WORST[worst] ?? null
}
