import { describe, expect, test } from 'vitest'
import { backOffMs } from '@/lib/sync/core/back-off'
import { base64url, fromBase64url } from '@/lib/sync/core/base64url'
import { chainNext, noteHash } from '@/lib/sync/core/chain'
import { parseJws } from '@/lib/sync/core/jws-parse'
import { mergePull } from '@/lib/sync/core/pull-merge'
import { afterPush, nextBatch, PUSH_CHARACTERS, PUSH_LIMIT, type OutboxItem } from '@/lib/sync/core/push-batch'
import { overlayEntry } from '@/lib/sync/core/overlay-list'
import { readRecordOrEnvelope } from '@/lib/sync/core/read-record'
import { isKnown } from '@/lib/inspection/record'
import type { ListedEntry } from '@/lib/pass/pass-list'
import { sha256Hex } from '@/lib/checklist/hash'

const items = (count: number, length = 10): OutboxItem[] =>
  Array.from({ length: count }, (_, index) => ({ hash: `h${index}`, id: `i${index}`, jws: 'x'.repeat(length) }))
const answer = (item: OutboxItem, outcome: 'stored' | 'duplicate' | 'quarantined' | 'refused' = 'stored', code: string | null = null) => ({
  id: item.id,
  hash: item.hash,
  outcome,
  code,
  seq: 1,
})

describe('push', () => {
  test('[S1] a batch holds at most 200 records and a bounded text, and never none while something is unsent', () => {
    expect(nextBatch({ items: items(201), limit: 999 })).toHaveLength(PUSH_LIMIT)
    expect(nextBatch({ items: items(4, PUSH_CHARACTERS / 2), limit: 200 })).toHaveLength(2)
    expect(nextBatch({ items: items(1, PUSH_CHARACTERS * 2), limit: 1 })).toHaveLength(1)
    expect(nextBatch({ items: [], limit: 200 })).toEqual([])
  })

  test('[S1] refused is set aside, quarantined and duplicate are answered for with what was said', () => {
    const batch = items(4)
    const [a, b, c, d] = batch as [OutboxItem, OutboxItem, OutboxItem, OutboxItem]
    const answers = [
      answer(a),
      answer(b, 'quarantined', 'wrong-role'),
      answer(c, 'refused', 'unreadable'),
      answer(d, 'duplicate', 'shown-differs'),
    ]
    const outcome = afterPush({ items: batch, limit: 200 }, batch, { state: 'answered', response: { answers, serverTime: 0 } })
    expect(outcome.answered).toEqual([
      { hash: 'h0', disposition: 'accepted', code: null },
      { hash: 'h1', disposition: 'quarantined', code: 'wrong-role' },
      { hash: 'h3', disposition: 'quarantined', code: 'shown-differs' },
    ])
    expect(outcome.setAside).toEqual([{ hash: 'h2', code: 'unreadable' }])
    expect(outcome).toMatchObject({ next: 'done', outbox: { items: [] } })
  })

  test('[S6] what was not answered for stays, and an answer with the wrong id is none', () => {
    const batch = items(3)
    const [a, b] = batch as [OutboxItem, OutboxItem]
    const response = { answers: [answer(a), { ...answer(b), id: 'another' }], serverTime: 0 }
    const outcome = afterPush({ items: batch, limit: 200 }, batch, { state: 'answered', response })
    expect(outcome.outbox.items.map(({ hash }) => hash)).toEqual(['h1', 'h2'])
    expect(afterPush({ items: batch, limit: 200 }, batch, { state: 'unanswered' })).toMatchObject({
      outbox: { items: batch },
      next: 'back-off',
    })
  })

  test('[S6] waits double from a second to a minute, each spread over its second half', () => {
    expect([1, 2, 3, 7, 50].map((failures) => backOffMs(failures, 1))).toEqual([1_000, 2_000, 4_000, 60_000, 60_000])
    expect([1, 2, 7].map((failures) => backOffMs(failures, 0))).toEqual([500, 1_000, 30_000])
  })
})

describe('pull', () => {
  const page = (seqs: readonly number[], more = false) => {
    const records = seqs.map((seq) => ({ seq, jws: '', hash: `h${seq}`, chain: `c${seq}`, disposition: 'accepted' as const, code: null }))
    const last = records.at(-1) ?? { seq: 5, chain: 'c5' }
    return {
      restored: false,
      records,
      notes: [],
      more,
      head: 9,
      snapshot: null,
      list: null,
      serverTime: 0,
      seq: last.seq,
      chain: last.chain,
    }
  }
  const cursor = { seq: 5, chain: 'c5' }

  test('[S4] a page without gap moves the cursor to its end', () => {
    expect(mergePull(cursor, page([6, 7]))).toMatchObject({ state: 'merge', cursor: { seq: 7, chain: 'c7' } })
    expect(mergePull(cursor, page([]))).toMatchObject({ state: 'merge', cursor })
  })

  test.each([
    ['a gap', page([7])],
    ['a repeat', page([6, 6])],
    ['an end that is not its last record', { ...page([6]), seq: 9 }],
    ['a promise of more and nothing in it', page([], true)],
  ])('[S4] %s is broken and moves nothing', (_, broken) => {
    expect(mergePull(cursor, broken).state).toBe('broken')
  })
})

describe('texts', () => {
  test('[S3] the chain changes with any part of it, and parts cannot run into each other', () => {
    const chains = [
      chainNext('', 'a.b.c', { disposition: 'accepted', code: null }, sha256Hex),
      chainNext('', 'a.b.d', { disposition: 'accepted', code: null }, sha256Hex),
      chainNext('0', 'a.b.c', { disposition: 'accepted', code: null }, sha256Hex),
      chainNext('', 'a.b.c', { disposition: 'quarantined', code: 'wrong-role' }, sha256Hex),
      chainNext('', 'a.b.c', { disposition: 'quarantined', code: 'shown-differs' }, sha256Hex),
    ]
    expect(new Set(chains).size).toBe(chains.length)
    expect(noteHash('ab', 'c', sha256Hex)).not.toBe(noteHash('a', 'bc', sha256Hex))
  })

  test('base64url has one spelling only', () => {
    for (let length = 0; length < 70; length += 1) {
      const bytes = Uint8Array.from({ length }, (_, index) => (index * 37) % 256)
      expect(fromBase64url(base64url(bytes))).toEqual(bytes)
    }
    expect(fromBase64url('AB')).toBeNull()
    expect(fromBase64url('AA')).toEqual(new Uint8Array(1))
    expect([fromBase64url('A'), fromBase64url('AA=='), fromBase64url('A+==')]).toEqual([null, null, null])
  })

  test.each([
    ['two parts', 'a.b'],
    ['four parts', 'a.b.c.d'],
    ['no JSON', `${base64url(Buffer.from('{}'))}.${base64url(Buffer.from('nonsense'))}.AA`],
    ['an array', `${base64url(Buffer.from('{}'))}.${base64url(Buffer.from('[]'))}.AA`],
    ['not UTF-8', `${base64url(Buffer.from('{}'))}.${base64url(Uint8Array.of(0xff, 0xfe))}.AA`],
    ['too deep', `${base64url(Buffer.from('{}'))}.${base64url(Buffer.from(`{"a":${'['.repeat(200_000)}`))}.AA`],
    ['an extension it must understand', `${base64url(Buffer.from('{"crit":["x"]}'))}.${base64url(Buffer.from('{}'))}.AA`],
  ])('a JWS of %s is none', (_, text) => {
    expect(parseJws(text)).toBeNull()
  })

  test('[T3] a known kind whose fields a newer build has changed is read by its effect', () => {
    const id = '01a23040-7e4f-7ab5-91cf-2e4cbcd19dc6'
    const newer = {
      v: 1,
      kind: 'hold',
      id,
      effect: 'stops',
      event: id,
      subject: { car: id },
      device: id,
      deviceSeq: 1,
      actor: id,
      at: 1,
      day: '2026-05-09',
      zones: ['a'],
    }
    const record = readRecordOrEnvelope(newer)
    expect(record).toMatchObject({ kind: 'hold', effect: 'stops', subject: { car: id } })
    expect(record !== null && isKnown(record)).toBe(false)
    expect(readRecordOrEnvelope({ ...newer, effect: 'perhaps' })).toBeNull()
  })
})

describe('the list of a device', () => {
  const pass = (id: string, state: 'live' | 'dead') => ({
    id,
    typedCode: id,
    state,
    why: state === 'dead' ? 'held since' : '',
    validFrom: '2026-05-09',
    days: 1,
    conditions: [],
    passengerSeatUsable: false,
  })
  const block = { kind: 'hold', words: 'contact', seeAgain: [], at: 1, stickerRemoved: null } as const
  const line = (more: Partial<ListedEntry>): ListedEntry => ({
    entry: 'e',
    code: 1,
    number: '47',
    plate: '',
    plateTail: '',
    colour: '',
    model: '',
    group: '',
    groupName: '',
    verdict: 'passed',
    blocks: [],
    passes: [],
    people: [],
    ...more,
  })

  test('[S4] what this device knows adds a block or a pass, and lifts no block of the list', () => {
    const held = line({ verdict: 'held', blocks: [block], passes: [pass('a', 'dead')] })
    const passed = line({ verdict: 'passed', passes: [pass('a', 'live'), pass('b', 'live')] })
    expect(overlayEntry(held, passed)).toMatchObject({ verdict: 'held', blocks: [block], passes: [pass('a', 'dead'), pass('b', 'live')] })
    expect(overlayEntry(passed, held)).toMatchObject({ verdict: 'held', blocks: [block], passes: [pass('a', 'dead'), pass('b', 'live')] })
  })

  test('[S4] a band that the list calls held stays held', () => {
    const person = { person: 'p', name: 'P', role: 'driver', bandNumber: '12', band: 'live', why: '', fit: 'not-asked' } as const
    const held = { ...person, band: 'held', why: 'held: contact' } as const
    expect(overlayEntry(line({ people: [held] }), line({ people: [person] })).people).toEqual([held])
    expect(overlayEntry(line({ people: [person] }), line({ people: [held] })).people).toEqual([held])
  })
})
