import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'

// The tokens live in app/globals.css and nowhere else; this reads the two blocks there.
const css = readFileSync('app/globals.css', 'utf8')
const sun = tokensOf(':root')
const night = { ...sun, ...tokensOf("[data-theme='night']") }

/** What stands on what, as text or as the inside of a shape. */
const TEXT_PAIRS = [
  ['ink', 'ground'],
  ['ink', 'surface'],
  ['ink', 'steel'],
  ['muted', 'ground'],
  ['muted', 'surface'],
  ['accent', 'ground'],
  ['accent', 'surface'],
  ['accent-ink', 'accent'],
  ['ground', 'ink'],
  ['ok-ink', 'ok'],
  ['advisory-ink', 'advisory'],
  ['fail-ink', 'fail'],
  ['ask-ink', 'ask'],
  ['ok', 'ground'],
  ['fail', 'ground'],
  ['ask', 'ground'],
] as const

/** Lines, focus rings and shapes that only have to be seen. */
const LINE_PAIRS = [
  ['line', 'ground'],
  ['line', 'surface'],
  ['line', 'steel'],
  ['wire', 'ground'],
  ['wire', 'steel'],
  ['muted', 'ground'],
  ['accent', 'ground'],
  ['accent', 'surface'],
  ['ok', 'steel'],
  ['fail', 'steel'],
  ['ask', 'steel'],
] as const

describe.each([
  ['sun', sun],
  ['night', night],
])('%s', (_theme, tokens) => {
  test.each(TEXT_PAIRS)('%s on %s has a contrast of 7 or more', (ink, ground) => {
    expect(contrast(tokens, ink, ground)).toBeGreaterThanOrEqual(7)
  })

  test.each(LINE_PAIRS)('%s against %s has a contrast of 3 or more', (line, ground) => {
    expect(contrast(tokens, line, ground)).toBeGreaterThanOrEqual(3)
  })
})

test.each([
  ['sun', sun, 'ground'],
  ['sun', sun, 'steel'],
  ['night', night, 'ground'],
  ['night', night, 'steel'],
] as const)('%s: the advisory’s triangle is seen by its fill or by its outline (case %#)', (_theme, tokens, ground) => {
  expect(Math.max(contrast(tokens, 'advisory', ground), contrast(tokens, 'advisory-ink', ground))).toBeGreaterThanOrEqual(3)
})

test('every colour named in the sun has its own value at night', () => {
  expect(Object.keys(tokensOf("[data-theme='night']")).sort()).toEqual(Object.keys(sun).sort())
})

test('the measuring itself: black on white is 21, equal colours are 1, and a published mid grey is 4.54', () => {
  const tokens = { black: '#000000', white: '#ffffff', grey: '#767676' }

  expect(contrast(tokens, 'black', 'white')).toBeCloseTo(21, 5)
  expect(contrast(tokens, 'grey', 'grey')).toBe(1)
  expect(contrast(tokens, 'grey', 'white')).toBeCloseTo(4.54, 2)
})

type Tokens = Readonly<Record<string, string>>

function tokensOf(selector: string): Tokens {
  const start = css.indexOf(`${selector} {`)
  const block = css.slice(start, css.indexOf('}', start))
  return Object.fromEntries(
    [...block.matchAll(/--([\w-]+):\s*(#[0-9a-f]{6});/g)].map(([, name = '', value = '']) => [name, value] as const),
  )
}

/** WCAG 2.2, definition of contrast ratio. */
function contrast(tokens: Tokens, one: string, other: string): number {
  const [a, b] = [luminance(tokens[one]), luminance(tokens[other])]
  return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05)
}

function luminance(hex: string | undefined): number {
  if (hex === undefined) throw new Error('no such token')
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const share = parseInt(hex.slice(at, at + 2), 16) / 255
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}
