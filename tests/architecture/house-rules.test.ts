import { Linter } from 'eslint'
import tseslint from 'typescript-eslint'
import { expect, test } from 'vitest'
import { banned, houseRules } from '../../scripts/lint/house-rules.mjs'

// Lint rules that no longer match anything look like clean code: each ban is shown a breach, and each cure is looked at.
const everywhere = banned({})
const pure = banned({ pure: true })

test.each([
  ['the full zod', "import { z } from 'zod'", /zod\/mini/],
  ['lucia outside the session', "import { Lucia } from 'lucia'", /lib\/platform\/session/],
  ['next-pwa outside its config', "import withPwa from 'next-pwa'", /config file/],
  ['the scanner library outside lib/scanner', "import { Html5Qrcode } from 'html5-qrcode'", /lib\/scanner/],
  ['a server action', "'use server'\nexport async function act() { return 1 }", /handle\(\)/],
  ['a server action in a function', "export async function act() { 'use server'; return 1 }", /handle\(\)/],
  ['a barrel', "export * from './thing'", /No barrels/],
  ['an async transaction', 'db.transaction(async (tx) => { await tx.run(1) })', /synchronously/],
  ['an async function as transaction', 'db.transaction(async function (tx) { await tx.run(1) })', /synchronously/],
  ['HTML set by hand', 'export const A = () => <p dangerouslySetInnerHTML={{ __html: x }} />', /Render text as text/],
  ['a palette class', 'export const A = () => <p className="p-2 bg-red-500" />', /token class/],
  ['a palette class with a variant', 'export const A = () => <p className="hover:text-gray-700/50" />', /token class/],
  ['a palette class on one side', 'export const A = () => <p className="border-b-zinc-200" />', /token class/],
  ['white by name', 'export const A = () => <p className="text-white" />', /token class/],
  ['a palette class in a template', 'export const A = () => <p className={`m-1 ${x} ring-blue-300`} />', /token class/],
  ['a raw hex colour', 'export const A = () => <p className="bg-[#ff0000]" />', /token class/],
  ['an empty catch', 'try { x() } catch {}', /handle it/],
])('%s is refused with its cure, everywhere', (_what, code, cure) => {
  expect(messages(code, everywhere)).toMatch(cure)
})

test.each([
  ['the clock', 'export const now = Date.now()', /no clock/],
  ['a new Date of now', 'export const now = new Date()', /no clock/],
  ['a timer', 'setTimeout(() => 1, 5)', /no clock/],
  ['chance', 'export const r = Math.random()', /draw no lots/],
  ['a random id', 'export const r = crypto.randomUUID()', /draw no lots/],
  ['the network', "export const r = fetch('/x')", /no IO/],
  ['the process', 'export const r = process.env', /no IO/],
  ['the console', 'console.log(1)', /no IO/],
  ['react', "import { useState } from 'react'", /no IO/],
  ['a node module', "import { readFileSync } from 'node:fs'", /no IO/],
  ['drizzle', "import { eq } from 'drizzle-orm'", /no IO/],
  ['the database', "import { db } from '@/db/client'", /no IO/],
])('%s is refused with its cure in pure folders', (_what, code, cure) => {
  expect(messages(code, pure)).toMatch(cure)
})

test.each([
  ['a token class', 'export const A = () => <p className="bg-surface text-ink border-line" />'],
  ['a date from a given instant', 'export const d = (ms: number) => new Date(ms)'],
  ['zod/mini', "import * as z from 'zod/mini'"],
  ['a synchronous transaction', 'db.transaction((tx) => tx.run(1))'],
  ['prose that names a colour', "export const words = 'two red flags'"],
])('%s is allowed', (_what, code) => {
  expect(messages(code, pure)).toBe('')
})

test.each([
  ['lib/cars/utils.ts', /says nothing/],
  ['lib/cars/helpers.ts', /says nothing/],
  ['lib/cars/types.ts', /says nothing/],
  ['lib/cars/CarCard.tsx', /kebab-case/],
  ['lib/cars/car_card.ts', /kebab-case/],
])('%s is refused as a file name', (file, cure) => {
  expect(messages('export const a = 1', { 'house/file-name': 'error' }, file)).toMatch(cure)
})

test.each(['app/p/[token]/page.tsx', 'lib/cars/car-card.tsx', 'tests/pass/token.test.ts', 'app/[...rest]/route.ts', 'next.config.ts'])(
  '%s is allowed as a file name',
  (file) => {
    expect(messages('export const a = 1', { 'house/file-name': 'error' }, file)).toBe('')
  },
)

test('a rule may be disabled with a reason only', () => {
  const rules = { 'house/disable-needs-reason': 'error', 'no-var': 'error' } as const

  expect(messages('// eslint-disable-next-line no-var\nvar a = 1', rules)).toMatch(/after `--`/)
  expect(messages('// eslint-disable-next-line no-var -- the worker shell is parsed by old engines\nvar a = 1', rules)).toBe('')
})

function messages(code: string, rules: Linter.RulesRecord, file = 'lib/cars/example.tsx'): string {
  const config: Linter.Config = {
    files: ['**/*.ts', '**/*.tsx'],
    plugins: { house: houseRules as never },
    languageOptions: { parser: tseslint.parser, parserOptions: { ecmaFeatures: { jsx: true } } },
    rules,
  }
  return new Linter().verify(code, [config], { filename: file }).map(({ message }) => message).join('\n') // prettier-ignore
}
