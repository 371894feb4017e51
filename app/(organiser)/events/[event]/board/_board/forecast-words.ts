import { clockTime } from '@/app/_crew/say-when'
import type { BoardGroup } from '@/lib/contracts/board'

/** `, last about 09:22, first session 09:40`: what the morning's pace makes of a group, and what it is measured against. Empty where nothing is known. */
export function forecastWords(
  { forecast, firstSessionAt, entries }: Pick<BoardGroup, 'forecast' | 'firstSessionAt' | 'entries'>,
  timeZone: string,
): string {
  const session = firstSessionAt === null ? [] : [`first session ${clockTime(firstSessionAt, timeZone)}`]
  return [...(entries === 0 ? [] : lastWords(forecast, timeZone)), ...session].map((words) => `, ${words}`).join('')
}

function lastWords({ is, lastAt }: BoardGroup['forecast'], timeZone: string): readonly string[] {
  if (is === 'all through') return ['all through']
  if (lastAt === null) return []
  return [`last about ${clockTime(lastAt, timeZone)}${is === 'late' ? ', too late' : ''}`]
}
