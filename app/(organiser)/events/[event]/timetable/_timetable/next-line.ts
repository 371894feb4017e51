import type { TimetableBlockBody } from '@/lib/contracts/events'

/** What most likely comes next: a session of the next group in turn, as long as the last one and right after it. */
export function nextLine(blocks: readonly TimetableBlockBody[], groups: readonly { readonly id: string }[]): TimetableBlockBody {
  const last = blocks.at(-1)
  const session = blocks.findLast(({ kind }) => kind === 'session')
  const turn = session === undefined ? 0 : groups.findIndex(({ id }) => id === session.group) + 1
  const startsAt = last?.endsAt ?? '09:00'
  const length = session === undefined ? 20 : Math.max(5, minutes(session.endsAt) - minutes(session.startsAt))
  return {
    kind: 'session',
    group: groups[turn % Math.max(1, groups.length)]?.id ?? null,
    startsAt,
    endsAt: clock(Math.min(minutes(startsAt) + length, 23 * 60 + 59)),
    noiseLimitDb: session?.noiseLimitDb ?? null,
  }
}

function minutes(time: string): number {
  const [hours = 0, rest = 0] = time.split(':').map(Number)
  return hours * 60 + rest
}

function clock(at: number): string {
  return `${String(Math.floor(at / 60)).padStart(2, '0')}:${String(at % 60).padStart(2, '0')}`
}
