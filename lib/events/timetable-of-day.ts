import type { TimetableBlockBody } from '@/lib/contracts/events'

/** What is wrong with one line of a day's timetable; `line` counts from 0. */
export interface TimetableProblem {
  readonly line: number
  readonly field: 'group' | 'startsAt' | 'endsAt'
  readonly words: string
}

/** Everything that cannot be so in a day's timetable, all at once: one track runs one session at a time, and each ends after it began. */
export function timetableProblems(blocks: readonly TimetableBlockBody[], groups: ReadonlySet<string>): readonly TimetableProblem[] {
  return blocks.flatMap((block, line) => {
    const problems: TimetableProblem[] = []
    if (block.endsAt <= block.startsAt)
      problems.push({ line, field: 'endsAt', words: `It ends at ${block.endsAt}, and begins at ${block.startsAt}.` })
    if (block.group !== null && !groups.has(block.group)) problems.push({ line, field: 'group', words: 'There is no such run group.' })
    if (block.kind === 'session' && block.group === null) problems.push({ line, field: 'group', words: 'A session is one group’s.' })
    const other =
      block.kind === 'session' && block.endsAt > block.startsAt
        ? blocks.findIndex((one, at) => at < line && one.kind === 'session' && overlaps(one, block))
        : -1
    if (other >= 0)
      problems.push({ line, field: 'startsAt', words: `It begins while the session of ${blocks[other]?.startsAt ?? ''} runs.` })
    return problems
  })
}

/** Lines in order of time. */
export function inOrder(blocks: readonly TimetableBlockBody[]): readonly TimetableBlockBody[] {
  return blocks.toSorted((a, b) => a.startsAt.localeCompare(b.startsAt) || a.endsAt.localeCompare(b.endsAt))
}

function overlaps(a: TimetableBlockBody, b: TimetableBlockBody): boolean {
  return a.startsAt < b.endsAt && b.startsAt < a.endsAt
}
