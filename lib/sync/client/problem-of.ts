import { StoreFull } from './device-store'
import { DayError, type DayProblem, type DayProblemCode } from './day-problem'

const NOTHING_SAVED = 'Nothing of this action was saved; everything saved before is kept.'
const ALL_KEPT = 'Everything recorded here is kept on this device.'

/** The words of each problem, written once. */
export const DAY_PROBLEMS: Readonly<Record<DayProblemCode, Omit<DayProblem, 'code'>>> = {
  'storage-full': {
    what: 'This device has no room left.',
    kept: NOTHING_SAVED,
    todo: 'Free some room (photos, videos, other pages), then save again. What you entered is still on the screen.',
  },
  'storage-failed': {
    what: 'This device could not write to its own storage.',
    kept: NOTHING_SAVED,
    todo: 'Save again. If it fails twice, reload this page; if it still fails, go on with another device.',
  },
  'storage-low': {
    what: 'This device is nearly full.',
    kept: ALL_KEPT,
    todo: 'Send what is unsent and free some room before the next car.',
  },
  'no-room-for-photo': {
    what: 'This device has no room left for the photograph.',
    kept: 'Everything recorded is still on this device. The photograph was not kept.',
    todo: 'Free some room and take it again, or answer without it and say so in words.',
  },
  locked: { what: 'Nobody is unlocked on this device.', kept: NOTHING_SAVED, todo: 'Unlock with your six digits, then save again.' },
  'wrong-pin': { what: 'These are not the six digits set on this device.', kept: ALL_KEPT, todo: 'Try again, or set new digits.' },
  'not-allowed': {
    what: 'Whoever is unlocked here may not record this.',
    kept: NOTHING_SAVED,
    todo: 'Ask somebody with the role for it. The acts of the chief need a device enrolled for the chief alone.',
  },
  'not-loaded': { what: 'The day is not loaded on this device.', kept: NOTHING_SAVED, todo: 'Go where there is signal and load the day.' },
  'not-passed': {
    what: 'Not everything required has been seen and found in order.',
    kept: NOTHING_SAVED,
    todo: 'Finish the walk-round first.',
  },
  'band-taken': {
    what: 'A band of this number is on somebody else’s wrist today.',
    kept: NOTHING_SAVED,
    todo: 'Read the number on the band again, or take another band.',
  },
  'no-key': { what: 'This device has no signing key for the event.', kept: NOTHING_SAVED, todo: 'Enrol it with a join code.' },
  'unreadable-draft': {
    what: 'What was entered is not complete or too long.',
    kept: NOTHING_SAVED,
    todo: 'Shorten or complete it, then save again.',
  },
  offline: { what: 'The server could not be reached.', kept: ALL_KEPT, todo: 'Go on working. It is sent when there is signal again.' },
  'refused-by-server': {
    what: 'The server does not accept this device at the moment.',
    kept: ALL_KEPT,
    todo: 'Go on working, and ask the organiser whether this device is still enrolled. Do not clear this browser’s data.',
  },
  'too-old': {
    what: 'This build of the page is older than the server accepts.',
    kept: ALL_KEPT,
    todo: 'Finish this car, then take the new version when it is offered.',
  },
  'needs-attention': {
    what: 'The server would not take a record of this device.',
    kept: ALL_KEPT,
    todo: 'Open “Needs attention”, and show it to the organiser.',
  },
  'clock-wrong': {
    what: 'The clock of this device is more than two minutes from the server’s.',
    kept: 'Records carry the difference, so their times can be put right.',
    todo: 'Set the clock to automatic.',
  },
  'no-web-locks': {
    what: 'This browser cannot keep two open pages of Lockwire apart.',
    kept: 'Nothing is lost by it.',
    todo: 'Keep only one page of Lockwire open on this device.',
  },
  'not-persisted': {
    what: 'This browser does not promise to keep what is stored.',
    kept: 'It keeps everything unless the device runs out of room.',
    todo: 'Add this page to the home screen, keep some hundred megabytes free, and send often.',
  },
  'wrong-words': {
    what: 'The word typed is not the one asked for.',
    kept: 'Nothing was discarded.',
    todo: 'Type it exactly as shown, or keep the record.',
  },
}

/** A problem with its words. */
export function dayProblem(code: DayProblemCode): DayProblem {
  return { code, ...DAY_PROBLEMS[code] }
}

export function dayError(code: DayProblemCode): DayError {
  return new DayError(dayProblem(code))
}

/** As `band-taken`, with the number and whose it is. */
export function bandTaken(number: string, holder: string): DayError {
  return new DayError({ ...dayProblem('band-taken'), what: `Band ${number} was given to ${holder} today.` })
}

/** What a failed commit means to a person. */
export function storageError(error: unknown): DayError {
  if (error instanceof DayError) return error
  return dayError(error instanceof StoreFull ? 'storage-full' : 'storage-failed')
}
