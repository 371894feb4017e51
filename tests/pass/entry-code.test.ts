import { expect, test } from 'vitest'
import { entryCodeText, readEntryCode } from '@/lib/pass/entry-code'
import { entryOfScan } from '@/app/bay/_screens/entry-of-scan'

const snapshot = { event: { code: 3 }, entries: [{ id: 'mine', code: 142 }] }

test('an entry code is read back, also typed in lower case', () => {
  expect(readEntryCode(entryCodeText({ event: 3, entry: 142 }))).toEqual({ event: 3, entry: 142 })
  expect(readEntryCode(' entry:3:142 ')).toEqual({ event: 3, entry: 142 })
})

test.each(['', '142', 'ENTRY:3', 'ENTRY:3:142:1', 'ENTRY:3:1e3', 'https://elsewhere.example/ENTRY:3:142', `ENTRY:3:${'9'.repeat(400)}`])(
  '%s is none',
  (text) => {
    expect(readEntryCode(text)).toBeNull()
  },
)

test('the bay finds its own event’s entry by it, and nothing by another event’s', () => {
  expect(entryOfScan('ENTRY:3:142', snapshot, null)).toBe('mine')
  expect(entryOfScan('ENTRY:4:142', snapshot, null)).toBeNull()
  expect(entryOfScan('ENTRY:3:141', snapshot, null)).toBeNull()
  expect(entryOfScan('ENTRY:3:142', null, null)).toBeNull()
  expect(entryOfScan('javascript:alert(1)', snapshot, null)).toBeNull()
})
