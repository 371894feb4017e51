import type { ProblemCode } from '@/lib/contracts/problem'

interface ErrorWords {
  /** 0 where no server answered. */
  readonly status: number
  readonly what: string
  readonly kept: string
  readonly todo: string
}

const NOTHING_CHANGED = 'Nothing was changed.'
const DEVICE_KEEPS = 'Everything recorded on this device is still on it.'

/** Code to status and words, the only place. A command may give more exact words for its case. */
export const ERRORS: Readonly<Record<ProblemCode, ErrorWords>> = {
  malformed: { status: 400, what: 'What was sent could not be read.', kept: NOTHING_CHANGED, todo: 'Reload the page and try again.' },
  invalid: {
    status: 422,
    what: 'Some of what was sent is not right.',
    kept: NOTHING_CHANGED,
    todo: 'Put right what is marked and send again.',
  },
  'not-json': { status: 415, what: 'What was sent is not JSON.', kept: NOTHING_CHANGED, todo: 'Reload the page and try again.' },
  'too-large': { status: 413, what: 'What was sent is too large.', kept: NOTHING_CHANGED, todo: 'Send less at once.' },
  'foreign-origin': {
    status: 403,
    what: 'The request came from a page of another address.',
    kept: NOTHING_CHANGED,
    todo: 'Open Lockwire at its own address and do it there.',
  },
  'not-signed-in': {
    status: 401,
    what: 'Nobody is signed in here, or the sign-in is over.',
    kept: NOTHING_CHANGED,
    todo: 'Sign in and try again.',
  },
  'sign-in-refused': {
    status: 401,
    what: 'E-mail and password do not belong together.',
    kept: NOTHING_CHANGED,
    todo: 'Check both and try again.',
  },
  'too-many-tries': {
    status: 429,
    what: 'There were too many wrong tries for this e-mail.',
    kept: NOTHING_CHANGED,
    todo: 'Wait a quarter of an hour, then try again.',
  },
  'device-not-known': {
    status: 401,
    what: 'This device is not enrolled for the event.',
    kept: DEVICE_KEEPS,
    todo: 'Enrol it again, or ask the organiser.',
  },
  'device-token-wrong': {
    status: 401,
    what: 'The request was not signed as this device signs.',
    kept: DEVICE_KEEPS,
    todo: 'Try again; if it goes on, enrol the device again.',
  },
  'device-token-late': {
    status: 401,
    what: 'The clock of this device is too far from the time of the server.',
    kept: DEVICE_KEEPS,
    todo: 'It is corrected by itself at the next try; if it goes on, set the clock.',
  },
  'device-retired': {
    status: 403,
    what: 'This device has been retired or reported lost.',
    kept: DEVICE_KEEPS,
    todo: 'Go on with another device, or ask the organiser.',
  },
  'protocol-too-old': {
    status: 426,
    what: 'This build of the page is older than the server accepts.',
    kept: DEVICE_KEEPS,
    todo: 'Finish this car, then take the new version when it is offered.',
  },
  forbidden: {
    status: 403,
    what: 'Your role does not allow this.',
    kept: NOTHING_CHANGED,
    todo: 'Ask somebody whose role does: the organiser or the chief scrutineer.',
  },
  missing: {
    status: 404,
    what: 'There is nothing of this address for you.',
    kept: NOTHING_CHANGED,
    todo: 'Go back and choose from the list.',
  },
  'rate-limited': { status: 429, what: 'That was asked too often.', kept: NOTHING_CHANGED, todo: 'Wait a moment and try again.' },
  busy: { status: 503, what: 'The server was busy.', kept: NOTHING_CHANGED, todo: 'Try again in a moment.' },
  'no-room': {
    status: 507,
    what: 'The disk of the server is full.',
    kept: NOTHING_CHANGED,
    todo: 'Tell the organiser: the server needs room before it can keep more.',
  },
  fault: {
    status: 500,
    what: 'Something in Lockwire went wrong.',
    kept: 'What was there before is still there.',
    todo: 'Try again; if it goes on, tell the organiser the time it happened.',
  },
  'join-code-unknown': {
    status: 404,
    what: 'This join code is not known.',
    kept: NOTHING_CHANGED,
    todo: 'Scan the code on the screen of the organiser again.',
  },
  'join-code-expired': {
    status: 410,
    what: 'This join code has run out.',
    kept: NOTHING_CHANGED,
    todo: 'Ask the organiser for a new one.',
  },
  'claim-unknown': {
    status: 404,
    what: 'This phone has not asked to join, or its request is gone.',
    kept: NOTHING_CHANGED,
    todo: 'Scan a join code again.',
  },
  'claim-not-accepted': {
    status: 409,
    what: 'The organiser has not accepted this person.',
    kept: NOTHING_CHANGED,
    todo: 'Wait, or speak to the organiser.',
  },
  'claim-used': {
    status: 409,
    what: 'Another device was already enrolled for this person with this request.',
    kept: NOTHING_CHANGED,
    todo: 'Use that device, or join again with a new code.',
  },
  'crew-decided': {
    status: 409,
    what: 'This request was already decided.',
    kept: 'The earlier decision stands.',
    todo: 'Reload the list.',
  },
  'not-crew': {
    status: 409,
    what: 'You hold no crew role at this event.',
    kept: NOTHING_CHANGED,
    todo: 'Ask the organiser to add you to the crew.',
  },
  'keys-used-up': {
    status: 409,
    what: 'This event has enrolled as many devices as it can, 255.',
    kept: NOTHING_CHANGED,
    todo: 'Use a device that is already enrolled.',
  },
  'device-decided': { status: 409, what: 'This device is no longer active.', kept: 'It stays as it was.', todo: 'Reload the list.' },
  'entry-link-over': {
    status: 410,
    what: 'This link is not known, has run out, or was taken back.',
    kept: 'What you declared is kept.',
    todo: 'Ask the organiser for a new link, or sign in with your password.',
  },
  'entry-link-needs-password': {
    status: 409,
    what: 'Your account may do more than declare a car, so a link from a mail does not open it.',
    kept: NOTHING_CHANGED,
    todo: 'Sign in with your password, then open the link again.',
  },
  'entry-link-no-address': {
    status: 409,
    what: 'The entry has no e-mail address for you yet.',
    kept: NOTHING_CHANGED,
    todo: 'Ask the organiser to add it, then open the link again.',
  },
  'declaration-closed': {
    status: 409,
    what: 'This entry takes no declaration any more: it is withdrawn, or the event is over.',
    kept: 'What was signed before stands.',
    todo: 'Speak to the organiser if that is a mistake.',
  },
  'import-refused': {
    status: 422,
    what: 'The list has rows that cannot be read.',
    kept: 'Nothing was imported.',
    todo: 'Put the named rows right and import again.',
  },
  'import-stale': {
    status: 409,
    what: 'The entries changed since the list was looked through.',
    kept: 'Nothing was imported.',
    todo: 'Look it through again and then import.',
  },
  'entry-edited-meanwhile': {
    status: 409,
    what: 'Somebody changed this entry while you were editing.',
    kept: 'Their change stands; what you typed is still in the form.',
    todo: 'Look at what they changed beside your fields, then save again if yours is right.',
  },
  'mail-count-changed': {
    status: 409,
    what: 'It would be another number of mails than you have seen.',
    kept: 'Nothing was written, and nothing is sent.',
    todo: 'Look at the new number, then send.',
  },
  'photo-not-one': {
    status: 415,
    what: 'What was sent is no photograph that Lockwire keeps.',
    kept: 'It was not kept.',
    todo: 'Send a JPEG, PNG or WebP, as a phone’s camera makes them.',
  },
  'photo-unreadable': {
    status: 422,
    what: 'The photograph is damaged or not whole.',
    kept: 'It was not kept.',
    todo: 'Take it again, or choose another.',
  },
  'photo-too-many-pixels': {
    status: 422,
    what: 'The photograph has more than 50 million pixels.',
    kept: 'It was not kept.',
    todo: 'Send a smaller one.',
  },
  'photo-other-hash': {
    status: 422,
    what: 'What arrived is not what was sent: it was changed on the way.',
    kept: 'It was not kept.',
    todo: 'Send it again.',
  },
  'no-network': { status: 0, what: 'The server could not be reached.', kept: DEVICE_KEEPS, todo: 'Try again when there is signal.' },
  'not-our-server': {
    status: 0,
    what: 'Something answered that is not Lockwire, perhaps the sign-in page of a network.',
    kept: DEVICE_KEEPS,
    todo: 'Open the network’s own page, or switch to mobile data.',
  },
}
