import type { Book, BookCheck } from './book'
import type { Place } from './checklist'

/** One place of the walk with what is asked there. */
export interface PlaceWalk {
  readonly place: Place
  /** No-go items, then other measured ones: each is answered by itself. */
  readonly oneByOne: readonly BookCheck[]
  /** The rest: closed with one answer that names what was seen. */
  readonly closing: readonly BookCheck[]
}

/** The asked checks by place, in the order of the walk; places where nothing is asked are left out. */
export function walkByPlace(book: Book, asked: readonly BookCheck[]): PlaceWalk[] {
  return book.checklist.places.flatMap((place) => {
    const here = asked.filter((check) => check.place === place.id)
    if (here.length === 0) return []
    const noGo = here.filter((check) => check.critical)
    const measured = here.filter((check) => !check.critical && isOneByOne(check))
    return [{ place, oneByOne: [...noGo, ...measured], closing: here.filter((check) => !isOneByOne(check)) }]
  })
}

/** Whether a check is answered by itself: a no-go item, or one that measures something. */
export function isOneByOne(check: Pick<BookCheck, 'critical' | 'measure'>): boolean {
  return check.critical || check.measure !== undefined
}

/** How many answers a walk takes, a place's closing sentence being one. */
export function answersOf(walk: readonly PlaceWalk[]): number {
  return walk.reduce((sum, each) => sum + each.oneByOne.length + (each.closing.length > 0 ? 1 : 0), 0)
}

/** The answer that closes a place, naming what was seen: "Front left: clearance, spacer seen, nothing found". Empty when nothing is left. */
export function closingSentence(place: Pick<Place, 'title'>, closing: readonly Pick<BookCheck, 'short'>[]): string {
  if (closing.length === 0) return ''
  return `${place.title}: ${closing.map((check) => check.short).join(', ')} seen, nothing found`
}
