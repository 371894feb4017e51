import { expect, test } from 'vitest'
import { forgetWalk, recallWalk, rememberWalk, type LeftAt, type TextStore } from '@/lib/walk/walk-memory'

const left: LeftAt = {
  place: 'front',
  check: 'wheels.tread',
  typed: { depthMm: '1,2' },
  mending: { typed: { depthMm: '0,8' }, reason: 'worn', note: 'swapped' },
  photos: ['a'.repeat(64)],
  at: 1_000,
}

function aStore(): TextStore & { readonly kept: Map<string, string> } {
  const kept = new Map<string, string>()
  return {
    kept,
    getItem: (key) => kept.get(key) ?? null,
    setItem: (key, value) => kept.set(key, value),
    removeItem: (key) => kept.delete(key),
  }
}

const broken: TextStore = {
  getItem: () => {
    throw new Error('closed to us')
  },
  setItem: () => {
    throw new Error('no room')
  },
  removeItem: () => {
    throw new Error('closed to us')
  },
}

test('what an older build remembered, which knew no photographs, is still understood', () => {
  const store = aStore()
  const { photos: _, ...older } = left
  store.setItem('lockwire.walk.car:e', JSON.stringify(older))
  expect(recallWalk(store, 'car:e')).toEqual({ ...left, photos: [] })
})

test('a walk is remembered at its very check, with what was typed and what was being put right', () => {
  const store = aStore()
  rememberWalk(store, 'car:e', left)
  expect(recallWalk(store, 'car:e')).toEqual(left)
  expect(recallWalk(store, 'car:other')).toBeNull()
})

test('a walk that is done is forgotten', () => {
  const store = aStore()
  rememberWalk(store, 'car:e', left)
  forgetWalk(store, 'car:e')
  expect(recallWalk(store, 'car:e')).toBeNull()
})

test('a store that is full or closed costs the memory and nothing else', () => {
  expect(() => rememberWalk(broken, 'car:e', left)).not.toThrow()
  expect(recallWalk(broken, 'car:e')).toBeNull()
  expect(() => forgetWalk(broken, 'car:e')).not.toThrow()
})

test.each([
  ['no JSON', '{"place":'],
  ['a list', '[]'],
  ['another build’s shape', '{"place":"front","check":null,"values":{},"at":1}'],
  ['a number where text was typed', '{"place":"front","check":null,"typed":{"a":1},"mending":null,"at":1}'],
  ['half a repair', '{"place":"front","check":null,"typed":{},"mending":{"typed":{}},"at":1}'],
])('what cannot be read is no memory: %s', (_, text) => {
  const store = aStore()
  rememberWalk(store, 'car:e', left)
  const [key] = [...store.kept.keys()] as [string]
  store.kept.set(key, text)
  expect(recallWalk(store, 'car:e')).toBeNull()
})
