import type { SubjectState } from '@/lib/inspection/state'
import { subjectKey } from '@/lib/inspection/subject'
import type { PassPayload } from '@/lib/pass/pass-payload'
import { passNumber } from '@/lib/pass/plate-tail'
import { qrText } from '@/lib/pass/qr-text'
import { encodePayload, encodeToken, signedMessage } from '@/lib/pass/token'
import { typedCode } from '@/lib/pass/typed-code'
import { civilDate, dayNumber } from '@/lib/rules/civil-date'
import type { DayClient, Issued, IssueBand, IssuePass } from './day-client'
import type { DayEntries } from './day-entries'
import type { DayMemory } from './day-memory'
import { signWith } from './device-key'
import type { Draft, DraftNote } from './draft'
import type { Enrolment } from './enrolment'
import type { Made } from './make-records'
import { bandHolder } from './band-holder'
import { bandTaken, dayError } from './problem-of'

interface IssuingParts {
  readonly enrolment: Enrolment
  readonly memory: DayMemory
  readonly cars: DayEntries
  readonly snapshot: DayClient['snapshot']
  readonly day: () => string
  readonly save: (draft: (nextPass: number) => Promise<readonly Draft[]>, notes: readonly DraftNote[]) => Promise<Made>
}

/** Longest a pass can be for, venue days: what its three bits hold. */
const MOST_DAYS = 7

/** Passes and bands made on the device, offline too: each signed by its key, with the device's own counter, and saved as a record in the same transaction. */
export function issuing({ enrolment, memory, cars, snapshot, day, save }: IssuingParts): {
  readonly pass: DayClient['issuePass']
  readonly band: DayClient['issueBand']
} {
  async function sign(payload: PassPayload): Promise<string> {
    const bytes = encodePayload(payload)
    return encodeToken(bytes, await signWith(enrolment.key, signedMessage(bytes)))
  }

  function frame(
    state: SubjectState,
    counter: number,
  ): Omit<PassPayload, 'type' | 'entry' | 'passengerSeatUsable' | 'number' | 'plateTail'> {
    const event = memory.snapshot()?.event
    if (event === undefined) throw dayError('not-loaded')
    if (state.verdict !== 'passed' && state.verdict !== 'passed with advisories') throw dayError('not-passed')
    const conditions = [...state.checks.values()].some((check) => check.dispensation !== null)
    return {
      kid: enrolment.says.kid,
      event: event.code,
      counter,
      validFrom: day(),
      days: validDays(memory, state, day(), event.lastDay),
      conditions,
      printedAhead: false,
    }
  }

  async function issue<K extends 'pass' | 'band'>(
    make: (counter: number) => Promise<{ readonly payload: PassPayload; readonly draft: Draft }>,
  ): Promise<Issued<K>> {
    let payload: PassPayload | null = null
    const made = await save(async (counter) => {
      const one = await make(counter)
      payload = one.payload
      return [one.draft]
    }, [])
    const saved = made.saved[0] as Issued<K>['saved'] | undefined
    if (saved === undefined || payload === null) throw new Error('impossible: a pass was saved without a record')
    const { token } = saved.record
    return { saved, payload, token, qrText: qrText(memory.snapshot()?.event.publicOrigin ?? '', token), typedCode: typedCode(token) }
  }

  return {
    pass: (request: IssuePass) =>
      issue<'pass'>(async (counter) => {
        const entry = cars.one(request.entry)
        if (entry === null) throw dayError('not-loaded')
        const state = memory.state(subjectKey({ car: entry.id }), day())
        const payload: PassPayload = {
          ...frame(state, counter),
          type: 'pass',
          entry: entry.code,
          passengerSeatUsable: request.passengerSeatUsable,
          number: passNumber(entry.number),
          plateTail: entry.plateTail,
        }
        const shown = request.shown === undefined ? {} : { shown: request.shown }
        return { payload, draft: { kind: 'pass', subject: { car: entry.id }, token: await sign(payload), ...shown } }
      }),
    band: (request: IssueBand) =>
      issue<'band'>(async (counter) => {
        const state = memory.state(subjectKey({ person: request.person }), day())
        const number = passNumber(request.bandNumber)
        if (number === '' || number !== request.bandNumber.toUpperCase()) throw dayError('unreadable-draft')
        const holder = bandHolder({ memory, snapshot, day }, number, request.person)
        if (holder !== null) throw bandTaken(number, holder)
        const payload: PassPayload = { ...frame(state, counter), type: 'band', entry: 0, passengerSeatUsable: false, number, plateTail: '' }
        return { payload, draft: { kind: 'band', subject: { person: request.person }, token: await sign(payload), bandNumber: number } }
      }),
  }
}

/** One venue day, unless the checklist has nothing that perishes (rule F9): then to the event's end. */
function validDays(memory: DayMemory, state: SubjectState, day: string, lastDay: string): number {
  const books = state.presentedHeads.map(({ record }) => memory.book(record.checklist, record.limits))
  const perishes = books.some((book) => book === null || book.checks.some((check) => !check.standing))
  if (perishes || books.length === 0) return 1
  return Math.min(MOST_DAYS, Math.max(1, dayNumber(civilDate(lastDay)) - dayNumber(civilDate(day)) + 1))
}
