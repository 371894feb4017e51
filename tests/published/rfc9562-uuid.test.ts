import { UUID } from 'uuidv7'
import { expect, test } from 'vitest'
import { RECORD_KINDS } from '@/lib/inspection/record'
import { newId } from '@/lib/platform/ids'

/** RFC 9562, appendix A.6, "Example of a UUIDv7 Value": 22 February 2022, 14:22:22.00 GMT-05:00. */
const EXAMPLE = '017F22E2-79B0-7CC3-98C4-DC0C0C07398F'
const UNIX_TS_MS = 0x017f_22e2_79b0
const RAND_A = 0xcc3
/** The 62 bits of rand_b: 0b01 and 0x8C4DC0C0C07398F. */
const RAND_B = { high: 0x18c4_dc0c, low: 0x0c07_398f }

const recordId = RECORD_KINDS.comment.shape.id

test('RFC 9562, A.6: the example is of version 7 and variant 10, as the library reads it', () => {
  const read = UUID.parse(EXAMPLE)
  expect([read.getVersion(), read.getVariant()]).toEqual([7, 'VAR_10'])
  expect(read.toString()).toBe(EXAMPLE.toLowerCase())
})

test('RFC 9562, A.6: its fields, put together again, are the example', () => {
  expect(UUID.fromFieldsV7(UNIX_TS_MS, RAND_A, RAND_B.high, RAND_B.low).toString()).toBe(EXAMPLE.toLowerCase())
})

test('RFC 9562, A.6: its first 48 bits are the instant it names', () => {
  const bits = [...UUID.parse(EXAMPLE).bytes.slice(0, 6)].reduce((value, byte) => value * 256 + byte, 0)
  expect(bits).toBe(UNIX_TS_MS)
  expect(bits).toBe(Date.parse('2022-02-22T14:22:22.000-05:00'))
})

test('RFC 9562, A.6: a record may have the example for its id, in the lower case of section 4', () => {
  expect(recordId.safeParse(EXAMPLE.toLowerCase()).success).toBe(true)
})

/** RFC 9562, appendix A.1 to A.5: examples of other versions. */
test.each([
  ['A.1, version 1', 'c232ab00-9414-11ec-b3c8-9f6bdeced846'],
  ['A.2, version 3', '5df41881-3aed-3515-88a7-2f4a814cf09e'],
  ['A.3, version 4', '919108f7-52d1-4320-9bac-f847db4148a8'],
  ['A.4, version 5', '2ed6657d-e927-568b-95e1-2665a8aea6a2'],
  ['A.5, version 6', '1ec9414c-232a-6b00-b3c8-9f6bdeced846'],
])('RFC 9562, %s: is a UUID and no id of a record', (name, text) => {
  expect(UUID.parse(text).getVersion()).toBe(Number(name.at(-1)))
  expect(recordId.safeParse(text).success).toBe(false)
})

/** RFC 9562, sections 4.1, 5.7, 5.9 and 5.10. */
test.each([
  ['of another variant', '017f22e2-79b0-7cc3-c8c4-dc0c0c07398f'],
  ['that is nil', '00000000-0000-0000-0000-000000000000'],
  ['that is max', 'ffffffff-ffff-ffff-ffff-ffffffffffff'],
  ['without its hyphens', EXAMPLE.toLowerCase().replaceAll('-', '')],
  ['in braces', `{${EXAMPLE.toLowerCase()}}`],
])('a UUID %s is no id of a record', (_, text) => {
  expect(recordId.safeParse(text).success).toBe(false)
})

test('ids made here are such ids, carry the time they were made, and sort by it', () => {
  const before = Date.now()
  const ids = Array.from({ length: 200 }, newId)
  const after = Date.now()
  for (const id of ids) {
    expect(recordId.safeParse(id).success).toBe(true)
    const at = Number.parseInt(id.replaceAll('-', '').slice(0, 12), 16)
    // The library may count a few milliseconds ahead where many are made in one.
    expect(at).toBeGreaterThanOrEqual(before)
    expect(at).toBeLessThanOrEqual(after + 10)
  }
  expect([...ids].sort()).toEqual(ids)
  expect(new Set(ids).size).toBe(ids.length)
})
