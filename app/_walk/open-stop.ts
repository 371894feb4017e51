import { goTo } from '@/app/_crew/use-location'
import { subjectKey } from '@/lib/inspection/subject'
import type { WalkStop } from '@/lib/walk/next-stop'
import { recallWalk, rememberWalk } from '@/lib/walk/walk-memory'
import type { WalkSubject } from './use-walk'

/** Opens one check, or a place's closing sentence. The place stands in the address, the check in the walk's memory; what was typed there stays. */
export function openStop(subject: WalkSubject, base: string, stop: WalkStop): void {
  const key = subjectKey(subject)
  const left = recallWalk(localStorage, key)
  if (left?.place !== stop.place || left.check !== stop.check)
    rememberWalk(localStorage, key, { ...stop, typed: {}, mending: null, photos: [], at: Date.now() })
  goTo(`${base}/${stop.place}`)
}
