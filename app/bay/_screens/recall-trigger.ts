import { nextWholeSession, sessionsOf } from '@/lib/inspection/sessions'
import type { RecallTrigger } from '@/lib/inspection/record'
import { triggerWords } from '@/lib/pass/trigger-words'
import { civilDate } from '@/lib/rules/civil-date'
import { venueInstant } from '@/lib/rules/venue-instant'
import type { DayClient, DayEntry } from '@/lib/sync/client/day-client'

export interface TriggerChoice {
  readonly id: string
  readonly words: string
  readonly trigger: RecallTrigger
}

/** Sessions offered at most: further ahead nobody plans a recall. */
const MOST_SESSIONS = 4

/** When a car can be recalled: after one of its group's next sessions as the timetable has them, in the wet, before a passenger. `now` is the device's clock, ms. */
export function triggerChoices(day: DayClient, entry: DayEntry, now: number): readonly TriggerChoice[] {
  const snapshot = day.snapshot()
  if (snapshot === null) return []
  const { group } = entry
  const next = nextWholeSession(day.dayLog(), snapshot.timetable, group, now + day.status().clockOffset)
  const planned = sessionsOf(snapshot.timetable, group).map(({ session }) => session)
  // A recall in the middle of a session may mean that very one.
  const sessions = [...new Set([next - 1, next, ...planned.filter((session) => session > next)])].filter((session) => session > 0)
  const triggers: readonly RecallTrigger[] = [
    ...sessions.slice(0, MOST_SESSIONS).map((session) => ({ when: 'session-over', group, session }) as const),
    { when: 'wet' },
    { when: 'passenger' },
  ]
  return triggers.map((trigger) => ({ id: JSON.stringify(trigger), words: triggerWords(trigger, snapshot), trigger }))
}

/** `14:30` today at the venue as a trigger; null where it is no time. */
export function timeTrigger(day: DayClient, text: string): RecallTrigger | null {
  const zone = day.snapshot()?.event.timeZone
  if (zone === undefined || !/^([01]\d|2[0-3]):[0-5]\d$/.test(text)) return null
  return { when: 'time', at: venueInstant(civilDate(day.status().day), text, zone) }
}
