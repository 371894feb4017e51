import { expect, test } from 'vitest'
import { jsonOf, textOf } from '../support/project-files'

interface Manifest {
  readonly dependencies: Readonly<Record<string, string>>
  readonly devDependencies: Readonly<Record<string, string>>
  readonly scripts: Readonly<Record<string, string>>
}
interface Lock {
  readonly packages: Readonly<Record<string, { readonly version?: string; readonly resolved?: string }>>
}

const manifest = jsonOf('package.json') as Manifest
const lock = jsonOf('package-lock.json') as Lock
const all = Object.entries({ ...manifest.dependencies, ...manifest.devDependencies })

// Published vulnerabilities below these; there is no audit service to ask, so the floors stand here.
test.each([
  ['next', '16.2.6'],
  ['react', '19.2.6'],
  ['react-dom', '19.2.6'],
])('%s is at least %s, below which it has known holes', (name, floor) => {
  const copies = Object.entries(lock.packages).filter(([path]) => path.endsWith(`node_modules/${name}`))

  expect(copies.length).toBeGreaterThan(0)
  for (const [path, { version }] of copies)
    expect(isAtLeast(version ?? '0', floor), `${path} is ${version ?? 'without version'}`).toBe(true)
})

test.each([
  ['16.2.6', '16.2.6', true],
  ['16.10.0', '16.2.6', true],
  ['16.2.5', '16.2.6', false],
  ['15.9.9', '16.2.6', false],
])('the floor test can tell: %s at least %s is %s', (version, floor, answer) => {
  expect(isAtLeast(version, floor)).toBe(answer)
})

test.each(all)('%s is pinned to one exact version (%s)', (_name, version) => {
  expect(version).toMatch(/^\d+\.\d+\.\d+$/)
})

test('the lock file holds exactly the versions that package.json names', () => {
  const different = all.filter(([name, version]) => lock.packages[`node_modules/${name}`]?.version !== version)

  expect(different).toEqual([])
})

test('the lock file records no download address: where packages come from is the machine’s own business', () => {
  const withAddress = Object.entries(lock.packages).filter(([, { resolved }]) => resolved !== undefined && !resolved.startsWith('file:'))

  expect(withAddress.map(([path]) => path)).toEqual([])
})

test('the README names the two commands, and both exist', () => {
  const readme = textOf('README.md')

  expect(readme).toContain('npm run demo')
  expect(readme).toContain('npm test')
  expect(manifest.scripts.demo).toBe('node scripts/demo.mjs')
  expect(manifest.scripts.test).toBe('node scripts/test.mjs')
})

test('CI runs the README’s test command', () => {
  expect(textOf('.ci/run')).toMatch(/^npm test$/m)
})

function isAtLeast(version: string, floor: string): boolean {
  const have = version.split('.').map(Number)
  const need = floor.split('.').map(Number)
  for (const [place, least] of need.entries()) {
    const is = have[place] ?? 0
    if (is !== least) return is > least
  }
  return true
}
