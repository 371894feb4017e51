import type { PassState, SubjectState, Verdict } from '@/lib/inspection/state'
import type { PassPayload } from '@/lib/pass/pass-payload'
import { addDays, civilDate } from '@/lib/rules/civil-date'
import type { Sticker } from './sticker'

export interface StickerEvent {
  readonly name: string
  readonly venue: string
  /** The venue's day now. */
  readonly today: string
}

/** What the log says of a pass: its own state and how its subject stands; null where the server has not heard of it. */
export interface Reported {
  readonly pass: PassState
  readonly subject: SubjectState
}

/** What a sticker with a good signature is worth now. Only a live pass of a subject that stands at passed, on its own day, is *valid*. */
export function stickerOf(payload: PassPayload, event: StickerEvent, reported: Reported | null): Sticker {
  const lastDay = addDays(civilDate(payload.validFrom), payload.days - 1)
  return {
    is: worthOf(payload, event, reported, lastDay),
    what: payload.type,
    number: payload.number,
    plateTail: payload.plateTail,
    event: event.name,
    venue: event.venue,
    firstDay: payload.validFrom,
    lastDay,
    today: event.today,
    conditions: payload.conditions || (reported?.pass.conditions.length ?? 0) > 0,
  }
}

function worthOf(
  { validFrom }: PassPayload,
  { today }: StickerEvent,
  reported: Reported | null,
  lastDay: string,
): Exclude<Sticker['is'], 'not-ours'> {
  // Dead comes before the day: who looks at a dead pass on another day must not read that it was good but for the date.
  if (reported !== null && reported.pass.state !== 'live') return 'not-valid'
  if (today < validFrom || today > lastDay) return 'another-day'
  if (reported === null) return 'not-reported'
  return PASSED.includes(reported.subject.verdict) ? 'valid' : 'not-valid'
}

const PASSED: readonly Verdict[] = ['passed', 'passed with advisories']
