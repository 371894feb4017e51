import { groupByCheck } from './check-group'
import { checkState } from './check-state'
import { readDay, type DayLog } from './day-log'
import { defectHistory } from './defects'
import { readDemands, type Demand } from './demands'
import { headsOf, type CheckHeads } from './heads'
import type { LogEntry } from './log-entry'
import { hashesToAnswer, passStates, readKillers } from './passes'
import { readPresented, type Presented } from './presented'
import { readLog, type SubjectLog } from './read-log'
import { readRepairs, type Repair } from './repairs'
import type { Block, CheckState, FoldContext, SubjectState } from './state'
import { kindOfKey, type SubjectKey } from './subject'
import { isOpen, isStandingWell, verdictOf } from './verdict'

/**
 * How one subject stands, from its records and the event-level ones (records of other subjects are left out). Pure, and a function of the
 * set of entries: the order they came in, and how often, makes no difference. Never throws on records that `parseRecord` let through.
 */
export function foldSubject(entries: readonly LogEntry[], key: SubjectKey, context: FoldContext): SubjectState {
  return foldLog(readLog(entries, key), readDay(entries), context)
}

/** As `foldSubject`, with the log and the day already read, so that an event's records are sorted out only once. */
export function foldLog(log: SubjectLog, day: DayLog, context: FoldContext): SubjectState {
  const presented = readPresented(log, kindOfKey(log.key), context)
  const heads = new Map([...groupByCheck(log)].map(([check, group]) => [check, headsOf(group, context)]))
  const allHeads = [...heads.values()]
  const repairs = readRepairs(allHeads, presented)
  const demands = readDemands(log, day, presented)
  const seen = checkStates(heads, presented, demands, repairs, context)
  const standing = demands.filter((demand) => !isEnded(demand, seen))
  const checks = withRequired(seen, standing)
  const withdrawnBy = withdrawalsInForce(log)
  const killers = readKillers(log, day, allHeads, demands, repairs, presented, context)
  const states = [...checks.values()]
  const blocks = standing.map((demand) => toBlock(demand, checks)).sort((a, b) => b.at - a.at || (a.hash < b.hash ? -1 : 1))
  return {
    key: log.key,
    verdict: verdictOf({
      isWithdrawn: withdrawnBy.length > 0,
      isHeld: blocks.length > 0,
      checks: states,
      isDerivable: presented.isDerivable,
      isPresented: presented.heads.length > 0,
      isLookedAt: hasLook(log),
      hasFindings: log.of('finding').length > 0,
      isDeclared: context.declared.has(log.key),
    }),
    withdrawn: withdrawnBy.length > 0,
    withdrawnBy,
    blocks,
    checks,
    depth: presented.depth,
    presentedHeads: presented.heads.map(({ hash, record }) => ({ hash, record })),
    open: states.filter((check) => isOpen(check) || (check.required && check.unanswered.length > 0)).map(({ check }) => check),
    fails: states.filter((check) => check.standing === 'fail').map(({ check }) => check),
    advisories: states.filter((check) => check.heads.some((head) => !head.lapsed && head.outcome === 'advisory')).map(({ check }) => check),
    toAnswer: hashesToAnswer(killers),
    defectHistory: defectHistory(allHeads),
    passes: passStates(killers, conditionsIn(states), context),
  }
}

/** Every check of the books, in checklist order, then any other that has records or is named by a demand. */
function checkStates(
  heads: ReadonlyMap<string, CheckHeads>,
  presented: Presented,
  demands: readonly Demand[],
  repairs: readonly Repair[],
  context: FoldContext,
): Map<string, CheckState> {
  const demandsOn = byCheck(demands, (demand) => demand.checks)
  const repairsOn = byCheck(repairs, (repair) => repair.reopens)
  const others = [...new Set([...heads.keys(), ...demandsOn.keys()])].filter((check) => !presented.definitions.has(check)).sort()
  const states = new Map<string, CheckState>()
  for (const check of [...presented.definitions.keys(), ...others]) {
    const asked = { demands: demandsOn.get(check) ?? [], repairs: repairsOn.get(check) ?? [] }
    states.set(check, checkState(check, heads.get(check), presented, asked, context))
  }
  return states
}

function byCheck<T>(items: readonly T[], checksOf: (item: T) => readonly string[]): ReadonlyMap<string, T[]> {
  const map = new Map<string, T[]>()
  for (const item of items) {
    for (const check of checksOf(item)) {
      const list = map.get(check)
      if (list) list.push(item)
      else map.set(check, [item])
    }
  }
  return map
}

/** A demand ends when it is lifted, or when each of its checks stands well with a look that answers it (rule F5). */
function isEnded(demand: Demand, checks: ReadonlyMap<string, CheckState>): boolean {
  if (demand.isLifted) return true
  if (demand.onlyChiefLifts || !demand.isDerivable) return false
  return demand.checks.every((check) => isSeenFor(demand.hash, checks.get(check)))
}

function isSeenFor(hash: string, check: CheckState | undefined): boolean {
  return check !== undefined && isStandingWell(check) && !check.unanswered.includes(hash)
}

/** What a standing demand names is required, whatever the depth; one that has ended asks nothing more. */
function withRequired(checks: ReadonlyMap<string, CheckState>, standing: readonly Demand[]): ReadonlyMap<string, CheckState> {
  const named = new Set(standing.flatMap((demand) => demand.checks))
  const becoming = [...checks.values()].filter(
    ({ check, required, standing }) => !required && named.has(check) && standing !== 'does-not-apply',
  )
  if (becoming.length === 0) return checks
  const all = new Map(checks)
  for (const check of becoming) all.set(check.check, { ...check, required: true })
  return all
}

function toBlock(demand: Demand, checks: ReadonlyMap<string, CheckState>): Block {
  const { hash, kind, reason, stations, onlyChiefLifts, at, stickerRemoved } = demand
  const checksLeft = onlyChiefLifts ? [] : demand.checks.filter((check) => !isSeenFor(hash, checks.get(check)))
  return { hash, kind, reason, stations, checksLeft, onlyChiefLifts, at, stickerRemoved }
}

/** Withdrawals that no believed `returned` names; a quarantined withdrawal stops as well (rule T1). */
function withdrawalsInForce(log: SubjectLog): readonly string[] {
  const changes = log.of('entry-changed')
  const returned = new Set(
    changes.filter((entry) => entry.isFull && entry.record.change.what === 'returned').flatMap(({ record }) => record.basis),
  )
  return changes.filter(({ hash, record }) => record.change.what === 'withdrawn' && !returned.has(hash)).map(({ hash }) => hash)
}

function hasLook(log: SubjectLog): boolean {
  return log
    .of('finding')
    .some(({ record, isFull }) => record.carriedFrom === undefined && record.outcome !== 'unseen' && (isFull || record.outcome === 'fail'))
}

function conditionsIn(checks: readonly CheckState[]): readonly string[] {
  return checks.flatMap((check) => check.heads.flatMap(({ record }) => (record.kind === 'dispensation' ? [record.conditions] : []))).sort()
}
