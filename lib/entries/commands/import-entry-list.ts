import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { audit, event, runGroup } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { entryImport } from '@/lib/contracts/entry-import'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { announce } from '@/lib/platform/live'
import { isRefusal, refuse, type Refusal } from '@/lib/platform/refusal'
import { sha256 } from '@/lib/platform/sha256'
import { foldWord } from '../entry-row'
import { planList, type ListPlan } from '../plan-list'
import { existingEntries } from '../queries/existing-entries'
import { readEntryList, type EntryList } from '../read-entry-list'
import { IMPORTED, writeImport } from './write-import'

/** How many problems, questions and remarks an answer carries at most; their true count stands beside them. */
const SHOWN = 500

type Input = InputOf<typeof entryImport>
type Answer = OutputOf<typeof entryImport>

/**
 * Imports an entry list into an event in one transaction, or only says what it would do. A list with any problem or open question commits nothing.
 * The same import sent twice (an answer was lost on the way) is told what the first one did.
 */
export function importEntryList({ params, body }: Input, actor: AccountActor, deps: Pick<Deps, 'database' | 'now'>): Answer | Refusal {
  const began = performance.now()
  const bytes = Buffer.from(body.base64, 'base64')
  const list = readEntryList(bytes, body.choices)
  const said = sha256(JSON.stringify([body.base64, body.choices, body.answers]))
  const result = transaction(deps.database, (tx) => {
    const target = tx
      .select()
      .from(event)
      .where(and(eq(event.id, params.event), eq(event.clubId, actor.clubId)))
      .get()
    if (!target) return refuse('missing')
    const existing = existingEntries(tx, target.id)
    const groups = tx.select().from(runGroup).where(eq(runGroup.eventId, target.id)).orderBy(runGroup.order).all()
    const names = groups.map(({ name }) => name)
    const planned = planList(list, names, existing, body.answers)
    const planHash = sha256(JSON.stringify([said, existing, names]))
    const answer = describe(list, planned, names, planHash, Math.round(performance.now() - began))
    if (body.dryRun) return answer
    const before = doneBefore(tx, target.id, body.planHash)
    if (before !== null) return { ...answer, ...before, committed: true }
    if (answer.problemCount > 0 || answer.openQuestions > 0 || answer.columnsNeeded) return refuse('import-refused')
    if (body.planHash !== planHash) return refuse('import-stale')
    writeImport(tx, {
      target,
      planned,
      groups,
      now: deps.now,
      accountId: actor.accountId,
      fileName: body.fileName,
      fileHash: sha256(body.base64),
      planHash,
    })
    return { ...answer, committed: true }
  })
  if (!isRefusal(result) && result.committed) announce(params.event)
  return result
}

/** What this very plan did when it was committed; null where it was not. */
function doneBefore(tx: Db, eventId: string, planHash: string): Pick<Answer, 'added' | 'changed' | 'unchanged'> | null {
  const rows = tx
    .select({ detail: audit.detail })
    .from(audit)
    .where(and(eq(audit.eventId, eventId), eq(audit.action, IMPORTED)))
    .all()
  const done = rows.find(({ detail }) => detail.planHash === planHash)?.detail
  return done === undefined ? null : { added: Number(done.added), changed: Number(done.changed), unchanged: Number(done.unchanged) }
}

function describe(
  list: EntryList,
  { plan, people, questions, problems, remarks }: ListPlan,
  groups: readonly string[],
  planHash: string,
  tookMs: number,
): Answer {
  const planned = [...plan.add, ...plan.change.map((change) => change.planned)]
  const known = new Set(groups)
  const open = new Set(questions.filter(({ answer }) => answer === null).map(({ id }) => id))
  // What is open comes first: with very many of them the answered ones are left off, not those that wait.
  const shown = [...questions.filter(({ answer }) => answer === null), ...questions.filter(({ answer }) => answer !== null)].slice(0, SHOWN)
  const order = new Map(questions.map(({ id }, index) => [id, index]))
  return {
    committed: false,
    encoding: list.encoding,
    separator: list.separator,
    headingRow: list.headingRow,
    columns: list.columns.map((column) => ({ ...column, samples: [...column.samples] })),
    columnsNeeded: list.columnsNeeded,
    rowCount: list.rowCount,
    added: plan.add.length,
    changed: plan.change.length,
    unchanged: plan.unchanged,
    people: new Set(planned.flatMap((entry) => entry.people.map(people.of))).size,
    notInList: plan.notInList,
    changes: plan.change.slice(0, SHOWN).map(({ planned: { number }, fields }) => ({ number, fields: [...fields] })),
    questions: shown
      .toSorted((a, b) => (order.get(a.id) ?? 0) - (order.get(b.id) ?? 0))
      .map((question) => ({ ...question, rows: [...question.rows], options: [...question.options] })),
    questionCount: questions.length,
    openQuestions: questions.filter(({ answer }) => answer === null).length,
    problems: problems.slice(0, SHOWN),
    problemCount: problems.length,
    remarks: remarks.slice(0, SHOWN),
    remarkCount: remarks.length,
    newGroups: [...new Set(planned.map(({ group }) => group))].filter((name) => !known.has(name) && !open.has(`group:${foldWord(name)}`)),
    planHash,
    tookMs,
  }
}
