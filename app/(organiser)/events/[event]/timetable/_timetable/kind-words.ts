import type { TimetableBlockBody } from '@/lib/contracts/events'

/** What a line of the timetable is called. */
export const KIND_WORDS: Readonly<Record<TimetableBlockBody['kind'], string>> = {
  session: 'session',
  briefing: 'briefing',
  'engine-curfew': 'engines stay off',
  break: 'break',
}
