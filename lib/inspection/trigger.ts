import type { DayLog } from './day-log'
import type { ReadEntry } from './read-log'
import type { RecallTrigger, RecordOf } from './record'

/**
 * The records that meet a trigger (rule F13). Wet counts once it was declared, also when it is dry again: what fell due stays due.
 * No clock is asked; a device that knows the hour has passed blocks by itself until the `day` record comes.
 */
export function recordsMeeting(
  trigger: RecallTrigger,
  day: DayLog,
  changes: readonly ReadEntry<RecordOf<'entry-changed'>>[],
): readonly string[] {
  switch (trigger.when) {
    case 'session-over':
      return hashesOf(
        day.said.filter(
          ({ record: { says } }) => says.what === 'session-over' && says.group === trigger.group && says.session >= trigger.session,
        ),
      )
    case 'time':
      return hashesOf(day.said.filter(({ record: { says } }) => says.what === 'time' && says.at >= trigger.at))
    case 'wet':
      return hashesOf(day.wetOn)
    case 'passenger':
      return hashesOf(changes.filter(({ record: { change } }) => change.what === 'people' && change.passengers.length > 0))
  }
}

/**
 * Whether the recall is due. A record it names in `answers` was over when it was made ("after session 1", said on the second day) and
 * does not make it due.
 */
export function isDue(recall: RecordOf<'recall'>, day: DayLog, changes: readonly ReadEntry<RecordOf<'entry-changed'>>[]): boolean {
  return recordsMeeting(recall.trigger, day, changes).some((hash) => !recall.answers.includes(hash))
}

function hashesOf(entries: readonly { readonly hash: string }[]): readonly string[] {
  return entries.map((entry) => entry.hash)
}
