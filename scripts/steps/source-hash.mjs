import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs'
import { join, relative } from 'node:path'
import { inRoot, root } from './root.mjs'

const BUILD_INPUTS = [
  'app', 'lib', 'db', 'checklists', 'public', 'types',
  'package.json', 'package-lock.json', 'tsconfig.json', 'next.config.ts', 'next.config.mjs', 'postcss.config.mjs', 'proxy.ts', 'instrumentation.ts',
  'instrumentation-client.ts', 'global.d.ts',
] // prettier-ignore

/** What the build and the copy step write into `public`: hashing it would make every build look out of date. */
const GENERATED = [/^public\/(sw|swe-worker|workbox|worker|fallback)[^/]*\.js(\.map)?$/, /^public\/.*\.wasm$/]

const SEED_INPUTS = ['db', 'checklists', 'tests/fixtures', 'lib/inspection', 'lib/rules', 'lib/checklist', 'lib/pass', 'lib/entries']

/** Hash of everything that goes into `next build`. */
export function buildHash() {
  const baked = Object.entries(process.env).filter(([name]) => name.startsWith('NEXT_PUBLIC_'))
  return hashOf(BUILD_INPUTS, [process.version, JSON.stringify(baked.sort())])
}

/** Hash of everything that goes into the demo's data. */
export function seedHash() {
  return hashOf(SEED_INPUTS, [])
}

function hashOf(paths, more) {
  const hash = createHash('sha256')
  for (const word of more) hash.update(`${word}\0`)
  for (const file of paths.flatMap((path) => filesUnder(inRoot(path))).sort()) {
    const name = relative(root, file).split('\\').join('/')
    if (GENERATED.some((pattern) => pattern.test(name))) continue
    hash.update(`${name}\0`).update(createHash('sha256').update(readFileSync(file)).digest())
  }
  return hash.digest('hex')
}

function filesUnder(path) {
  if (!existsSync(path)) return []
  if (!statSync(path).isDirectory()) return [path]
  return readdirSync(path, { withFileTypes: true }).flatMap((entry) => filesUnder(join(path, entry.name)))
}
