import type { BookCheck } from '@/lib/checklist/book'
import { isCarried, isLook, outcomeOf, severity, type CheckLine } from './check-line'
import type { CheckGroup } from './check-group'
import { namedBy } from './edges'
import type { Demand } from './demands'
import type { CheckHeads } from './heads'
import type { Presented } from './presented'
import type { Repair } from './repairs'
import type { CheckState, FoldContext, Head, Standing } from './state'

/** What is asked of one check besides its own heads. */
export interface Asked {
  readonly demands: readonly Demand[]
  readonly repairs: readonly Repair[]
}

/** How one check of the subject stands (rules F2–F5, F9–F12). */
export function checkState(
  check: string,
  heads: CheckHeads | undefined,
  presented: Presented,
  asked: Asked,
  context: FoldContext,
): CheckState {
  const definitions = presented.definitions.get(check) ?? []
  const isPerishable = definitions.length === 0 || definitions.some((definition) => !definition.standing)
  const shown = (heads?.heads ?? []).map((line) => toHead(line, heads as CheckHeads, isPerishable, context.day))
  const counting = shown.filter((head) => !head.lapsed)
  const answered = asked.demands.length + asked.repairs.length === 0 ? NOTHING : answeredBy(heads, shown)
  const openRepairs = asked.repairs.map(({ hash }) => hash).filter((hash) => !answered.has(hash))
  const openDemands = asked.demands.filter(({ hash, isLifted }) => !isLifted && !answered.has(hash)).map(({ hash }) => hash)
  return {
    check,
    standing: standing(counting, definitions, heads?.group, presented, check, openRepairs.length > 0),
    heads: shown,
    disagreement: counting.some((head) => head.outcome !== counting[0]?.outcome),
    // A standing demand makes it required too; that is known only when every check is, and added by the caller.
    required: presented.required.has(check) || openRepairs.length > 0,
    unanswered: [...openDemands, ...openRepairs].sort(),
    toAnswer: [...asked.demands, ...asked.repairs].map(({ hash }) => hash).sort(),
    dispensation: dispensationOf(counting),
  }
}

const NOTHING: ReadonlySet<string> = new Set()

function answeredBy(heads: CheckHeads | undefined, shown: readonly Head[]): ReadonlySet<string> {
  const answered = new Set<string>()
  heads?.heads.forEach((line, index) => {
    if (!shown[index]?.lapsed) for (const hash of lookAnswers(line, heads.group)) answered.add(hash)
  })
  return answered
}

function toHead(line: CheckLine, { group }: CheckHeads, isPerishable: boolean, day: string): Head {
  const outcome = outcomeOf(line)
  const mayLapse = line.record.kind !== 'dispensation' && (outcome === 'ok' || outcome === 'advisory')
  return {
    hash: line.hash,
    record: line.record,
    outcome,
    quarantined: !line.isFull,
    lapsed: mayLapse && isPerishable && (line.record.day !== day || isCarried(line)),
    beneath:
      line.record.kind === 'dispensation'
        ? namedBy(line, group)
            .filter((target) => outcomeOf(target) === 'fail')
            .map(({ hash }) => hash)
        : [],
  }
}

function standing(
  counting: readonly Head[],
  definitions: readonly BookCheck[],
  group: CheckGroup | undefined,
  presented: Presented,
  check: string,
  isReopened: boolean,
): Standing {
  const worst = counting.reduce<Head | undefined>(
    (most, head) => (most && severity(most.outcome) >= severity(head.outcome) ? most : head),
    undefined,
  )
  if (worst?.outcome === 'fail') return 'fail'
  if (presented.isDerivable && !presented.applicable.has(check)) return 'does-not-apply'
  if (!worst || worst.outcome === 'unseen') return 'not-seen'
  if (worst.outcome === 'could-not-see') return 'could-not-see'
  if (isReopened) return 'not-seen'
  const standingHeads = counting.filter((head) => head.outcome === worst.outcome)
  return standingHeads.every((head) => isDecided(group?.byHash.get(head.hash), definitions, group)) ? worst.outcome : 'undecided'
}

/** Whether an ok or advisory rests on what the check measures, judged under every limit in force (rule F3). */
function isDecided(line: CheckLine | undefined, definitions: readonly BookCheck[], group: CheckGroup | undefined): boolean {
  if (!line || !group) return false
  if (line.record.kind === 'dispensation') return true
  if (line.record.kind === 'ruling') {
    // It measured nothing itself: one of the looks it chose from must have.
    const looks = namedBy(line, group).filter((target) => outcomeOf(target) === 'ok' || outcomeOf(target) === 'advisory')
    return !definitions.some(isMeasured) || looks.some((look) => isDecided(look, definitions, group))
  }
  const { measured, judgement, paramsHash } = line.record
  if (judgement?.outcome === 'undecided' || judgement?.outcome === 'fail') return false
  return definitions.every((definition) => {
    const isUnderLimits = definition.paramsHash === null || definition.paramsHash === paramsHash
    if (isMeasured(definition)) return hasValue(measured) && isUnderLimits
    return isUnderLimits || paramsHash === undefined
  })
}

function isMeasured({ measure }: BookCheck): boolean {
  return measure !== undefined
}

function hasValue(measured: Readonly<Record<string, unknown>> | undefined): boolean {
  return measured !== undefined && Object.values(measured).some((value) => value !== null && value !== '')
}

/**
 * What a head answers by having looked (rules F5, F10, F11). A ruling or dispensation is made at a table: it answers what the looks it
 * rests on answered, and no more.
 */
function lookAnswers(line: CheckLine, group: CheckGroup, seen: ReadonlySet<string> = new Set()): readonly string[] {
  if (line.record.kind === 'finding') return isLook(line) && line.isFull ? line.record.answers : []
  if (seen.has(line.hash)) return []
  return namedBy(line, group).flatMap((target) => lookAnswers(target, group, new Set([...seen, line.hash])))
}

function dispensationOf(counting: readonly Head[]): CheckState['dispensation'] {
  for (const { hash, record } of counting) {
    if (record.kind === 'dispensation') return { hash, conditions: record.conditions, until: record.until }
  }
  return null
}
