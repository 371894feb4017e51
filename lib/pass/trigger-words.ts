import type { RecallTrigger } from '@/lib/inspection/record'
import { venueTime } from './venue-time'

/** As much of an event as its recalls are worded by. */
export interface TriggerNames {
  readonly groups: readonly { readonly id: string; readonly name: string }[]
  readonly event: { readonly timeZone: string }
}

/** When a recall falls due, in words: `after session 2 of Novice`. */
export function triggerWords(trigger: RecallTrigger, { groups, event }: TriggerNames): string {
  switch (trigger.when) {
    case 'session-over': {
      const group = groups.find(({ id }) => id === trigger.group)?.name
      return `after session ${trigger.session}${group === undefined ? '' : ` of ${group}`}`
    }
    case 'time':
      return `at ${venueTime(trigger.at, event.timeZone)}`
    case 'wet':
      return 'once wet is declared'
    case 'passenger':
      return 'before a passenger rides along'
  }
}
