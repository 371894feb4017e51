import { expect, test } from 'vitest'
import { readEnv } from '@/lib/platform/env'

test('with nothing said it serves localhost from ./data', () => {
  expect(readEnv({})).toEqual({
    origin: 'http://localhost:3000',
    databaseFile: './data/lockwire.db',
    photoFolder: './data/lockwire.db-photos',
    smtp: null,
    production: false,
    logLevel: 'info',
  })
  expect(readEnv({ PORT: '4100' }).origin).toBe('http://localhost:4100')
})

test.each([
  ['https://bay.example.org/', 'https://bay.example.org'],
  ['https://bay.example.org:8443', 'https://bay.example.org:8443'],
  ['http://127.0.0.1:3000', 'http://127.0.0.1:3000'],
])('%s is served as %s', (given, origin) => {
  expect(readEnv({ LOCKWIRE_ORIGIN: given }).origin).toBe(origin)
})

test.each([
  [{ LOCKWIRE_ORIGIN: 'http://bay.example.org' }, /https/],
  [{ LOCKWIRE_ORIGIN: 'http://192.168.1.20:3000' }, /https/],
  [{ LOCKWIRE_ORIGIN: 'bay.example.org' }, /LOCKWIRE_ORIGIN/],
  [{ LOCKWIRE_ORIGIN: 'javascript:alert(1)' }, /LOCKWIRE_ORIGIN/],
  [{ PORT: 'three' }, /PORT/],
  [{ LOCKWIRE_DB: '' }, /LOCKWIRE_DB/],
  [{ LOCKWIRE_LOG: 'loud' }, /LOCKWIRE_LOG/],
])('%j is refused at start, in words', (variables, words) => {
  expect(() => readEnv(variables)).toThrow(words)
})
