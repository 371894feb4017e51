import type { TimetableBlockBody } from '@/lib/contracts/events'

const SESSION_MIN = 20
/** Invented for the demo, static at 0.5 m, dB(A): the neighbours have a quieter last hour. */
const NOISE_DB = 98
const LAST_HOUR_DB = 92

/** One day of the demo: engines stay off until 08:00, briefing at 08:15, the groups in turn from 09:00 to 17:00 with an hour of lunch. */
export function demoTimetable(groups: readonly string[]): readonly TimetableBlockBody[] {
  const everybody = { group: null, noiseLimitDb: null }
  return [
    { ...everybody, kind: 'engine-curfew', startsAt: '06:00', endsAt: '08:00' },
    { ...everybody, kind: 'briefing', startsAt: '08:15', endsAt: '08:30' },
    ...inTurn(groups, 9 * 60, 12 * 60),
    { ...everybody, kind: 'break', startsAt: '12:00', endsAt: '13:00' },
    ...inTurn(groups, 13 * 60, 17 * 60),
  ]
}

function inTurn(groups: readonly string[], from: number, to: number): readonly TimetableBlockBody[] {
  return Array.from({ length: (to - from) / SESSION_MIN }, (_, index) => {
    const start = from + index * SESSION_MIN
    return {
      kind: 'session',
      group: groups[index % groups.length] ?? null,
      startsAt: clock(start),
      endsAt: clock(start + SESSION_MIN),
      noiseLimitDb: start >= 16 * 60 ? LAST_HOUR_DB : NOISE_DB,
    }
  })
}

function clock(minutes: number): string {
  return `${String(Math.floor(minutes / 60)).padStart(2, '0')}:${String(minutes % 60).padStart(2, '0')}`
}
