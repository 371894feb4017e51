import { expect, test } from 'vitest'
import { projectFiles, sources, textOf } from '../support/project-files'

const ours = sources('app', 'lib', 'db')

test('there is something to look at', () => {
  expect(ours.length).toBeGreaterThan(20)
})

test('no source file is longer than 300 lines', () => {
  expect(ours.filter((file) => lines(file) > 300).map((file) => `${file}: ${lines(file)}`)).toEqual([])
})

test('a page composes: no page.tsx is longer than 40 lines', () => {
  const pages = ours.filter((file) => file.endsWith('/page.tsx'))

  expect(pages.filter((file) => lines(file) > 40).map((file) => `${file}: ${lines(file)}`)).toEqual([])
})

test('every module that imports the database begins with server-only, so that no browser bundle can hold it', () => {
  const importers = sources('app', 'lib').filter((file) => importsDb(textOf(file)))

  expect(importers.filter((file) => !beginsServerOnly(textOf(file)))).toEqual([])
})

test('every module of db that opens or writes begins with server-only', () => {
  const modules = sources('db').filter(
    (file) =>
      !file.startsWith('db/schema/') && !isSeed(file) && /from 'better-sqlite3'|from 'drizzle-orm\/better-sqlite3/.test(textOf(file)),
  )

  expect(modules.length).toBeGreaterThan(0)
  expect(modules.filter((file) => !beginsServerOnly(textOf(file)))).toEqual([])
})

test('no tracked file holds a path of somebody’s machine or the address of a package registry', () => {
  // Built from pieces, so that this file does not find itself.
  const machine = ['work', 'root', 'home/[a-z]+', 'Users/[A-Za-z]+'].map((folder) => `(?<![\\w.~@)\\]}-])/${folder}/`)
  const hosts = [
    ['registry', 'npmjs', 'org'],
    ['registry', 'yarnpkg', 'com'],
    ['npm', 'pkg', 'github', 'com'],
  ].map((parts) => parts.join('\\.'))
  const pattern = new RegExp([...machine, ...hosts].join('|'))
  const texts = projectFiles().filter((file) => /\.(tsx?|mjs|cjs|js|json|md|css|sql|ya?ml|csv|html)$|\/run$|^\.[a-z]+$/.test(file))

  expect(pattern.test(`see ${['', 'home', 'anna', 'x'].join('/')}`)).toBe(true)
  expect(texts.flatMap((file) => findings(file, pattern))).toEqual([])
})

test('there are no server actions anywhere', () => {
  const directive = new RegExp(['^\\s*[\'"]use ', 'server[\'"]'].join(''), 'm')

  expect(ours.filter((file) => directive.test(textOf(file)))).toEqual([])
})

test('no test is skipped, left to do or run alone', () => {
  const left = /\b(?:test|it|describe)\.(?:skip|todo|only|skipIf|runIf)\b/

  expect(sources('tests').filter((file) => file !== 'tests/architecture/files.test.ts' && left.test(textOf(file)))).toEqual([])
})

function lines(file: string): number {
  return textOf(file).trimEnd().split('\n').length
}

function isSeed(file: string): boolean {
  return file === 'db/seed.ts' || file.startsWith('db/scenarios/')
}

/** Type-only imports vanish in the build and reach nothing. */
function importsDb(text: string): boolean {
  return /^import (?!type\b)[^;]*? from '(?:@\/db(?:\/[^']*)?|(?:\.\.\/)+db\/[^']*)'/m.test(text)
}

function beginsServerOnly(text: string): boolean {
  return /^(?:\s|\/\/[^\n]*\n|\/\*[\s\S]*?\*\/)*import 'server-only'/.test(text)
}

function findings(file: string, pattern: RegExp): readonly string[] {
  return textOf(file)
    .split('\n')
    .flatMap((line, index) => (pattern.test(line) ? [`${file}:${String(index + 1)}: ${line.trim().slice(0, 120)}`] : []))
}
