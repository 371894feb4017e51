import type { OutcomeState } from '@/app/_ui/outcome-shape'
import type { DeskStanding } from '@/lib/desk/desk-standing'

/** How somebody stands, in words. */
export function standingWords(stands: DeskStanding): string {
  switch (stands.is) {
    case 'banded':
      return `band ${stands.band}`
    case 'stopped':
      return stands.why
    case 'ready':
      return 'all seen, no band yet'
    case 'begun':
      return `${stands.toSee} to see`
    case 'not begun':
      return 'not seen yet'
  }
}

/** The shape before those words. */
export function standingShape(stands: DeskStanding): OutcomeState {
  if (stands.is === 'banded') return 'ok'
  if (stands.is !== 'stopped') return 'none'
  return stands.why === 'held' ? 'held' : 'fail'
}
