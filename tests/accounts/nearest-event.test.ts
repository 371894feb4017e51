import { expect, test } from 'vitest'
import { nearestEvent } from '@/lib/accounts/nearest-event'
import { civilDate } from '@/lib/rules/civil-date'

const anEvent = (id: string, firstDay: string, lastDay: string, today = '2026-05-10') => ({
  id,
  firstDay,
  lastDay,
  today: civilDate(today),
})
const past = anEvent('past', '2026-04-01', '2026-04-02')
const older = anEvent('older', '2026-03-01', '2026-03-01')
const running = anEvent('running', '2026-05-09', '2026-05-10')
const soon = anEvent('soon', '2026-05-20', '2026-05-20')
const later = anEvent('later', '2026-06-20', '2026-06-20')

test.each([
  [[later, past, running, soon], 'running', 'one of today before all'],
  [[later, past, soon], 'soon', 'else the next to come'],
  [[past, older], 'past', 'else the last that was'],
])('of several events: %#', (events, id) => {
  expect(nearestEvent(events)?.id).toBe(id)
})

test('today is each venue’s own day', () => {
  expect(nearestEvent([anEvent('east', '2026-05-11', '2026-05-11', '2026-05-11'), soon])?.id).toBe('east')
  expect(nearestEvent([])).toBeNull()
})
