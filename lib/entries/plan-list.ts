import type { RowProblem, RowRemark } from './entry-row'
import { startAsking, type ListAnswer, type ListQuestion } from './list-question'
import { planImport, type ExistingEntry, type ImportPlan } from './plan-import'
import type { EntryList } from './read-entry-list'
import { resolveCars } from './resolve-cars'
import { resolveGroups } from './resolve-groups'
import { resolvePeople, type People } from './resolve-people'

/** What a list would do to an event, with everything that is still to be said about it. */
export interface ListPlan {
  readonly plan: ImportPlan
  readonly people: People
  readonly questions: readonly ListQuestion[]
  readonly problems: readonly RowProblem[]
  readonly remarks: readonly RowRemark[]
}

/** Plans the import of a list that was read: questions with the answers given so far, and what those answers come to. */
export function planList(
  list: EntryList,
  groupNames: readonly string[],
  existing: readonly ExistingEntry[],
  answers: readonly ListAnswer[],
): ListPlan {
  const asking = startAsking(answers)
  const groups = resolveGroups(list.rows, groupNames, asking)
  const allGroups = [...new Set([...groupNames, ...[...groups.values()].filter((name) => name !== null)])]
  const known = existing.map(({ number, plate, people }) => ({ number, plate, names: people.map(({ name }) => name) }))
  const cars = resolveCars(list.rows, groups, allGroups, known, asking)
  const people = resolvePeople(cars.entries, asking)
  const plan = planImport(cars.entries, people, existing, asking)
  return {
    plan,
    people,
    questions: asking.questions,
    problems: [...list.problems, ...cars.problems, ...plan.problems].sort((a, b) => a.row - b.row),
    remarks: [...list.remarks, ...people.remarks].sort((a, b) => a.row - b.row),
  }
}
