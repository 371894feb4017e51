import fc from 'fast-check'
import type { PassPayload } from '@/lib/pass/pass-payload'
import { addDays, civilDate } from '@/lib/rules/civil-date'

const short = fc.string({ unit: fc.constantFrom(...Array.from('ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789-./')), maxLength: 6 })
const u16 = fc.integer({ min: 0, max: 65_535 })

/** Any payload that a token can carry. */
export const anyPayload: fc.Arbitrary<PassPayload> = fc
  .record({
    type: fc.constantFrom('pass' as const, 'band' as const),
    kid: fc.integer({ min: 0, max: 255 }),
    event: u16,
    counter: u16,
    entry: u16,
    validFrom: u16.map((days) => addDays(civilDate('2020-01-01'), days)),
    days: fc.integer({ min: 1, max: 7 }),
    conditions: fc.boolean(),
    passengerSeatUsable: fc.boolean(),
    printedAhead: fc.boolean(),
    number: short,
    plateTail: short,
  })
  .map((payload) =>
    payload.type === 'band' ? { ...payload, entry: 0, plateTail: '', number: payload.number === '' ? '1' : payload.number } : payload,
  )
