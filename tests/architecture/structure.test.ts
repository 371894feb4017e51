import { spawnSync } from 'node:child_process'
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname, join, resolve } from 'node:path'
import { expect, test } from 'vitest'

const root = resolve(import.meta.dirname, '../..')

/** A small project that breaks each rule once: a rule that no longer matches anything would look like clean code. */
const BREACHES: Readonly<Record<string, string>> = {
  'db/client.ts': "export const db = 1\nexport * as sqlite from 'better-sqlite3'",
  'lib/cars/queries.ts': "import { db } from '../../db/client'\nexport const cars = db",
  'lib/cars/model.ts': "import { db } from '../../db/client'\nexport const model = db",
  'lib/cars/use-cars.ts': "import { cars } from './queries'\nexport const useCars = cars",
  'lib/people/queries.ts': "import { model } from '../cars/model'\nexport const people = model",
  'lib/holds/commands.ts': "import { handle } from '../http/server'\nexport const hold = handle",
  'lib/http/server.ts': "import { fold } from '../inspection/fold'\nexport const handle = fold",
  'lib/inspection/fold.ts':
    "import { client } from '../sync/client/loop'\nimport { readFileSync } from 'node:fs'\nexport const fold = [client, readFileSync]",
  'lib/rules/angle.ts': "import { check } from '../checklist/check'\nexport const angle = check",
  'lib/checklist/check.ts': "import { useState } from 'react'\nexport const check = useState",
  'lib/sync/client/loop.ts': "import { push } from '../server/push'\nexport const client = push",
  'lib/sync/server/push.ts': "import { wire } from '../../../app/_ui/wire'\nexport const push = wire",
  'lib/sync/core/merge.ts': "import { ask } from '../../platform/ask'\nexport const merge = ask",
  'lib/platform/ask.ts': "import { cars } from '../cars/queries'\nexport const ask = cars",
  'lib/loops/one.ts': "import { two } from './two'\nexport const one: unknown = two",
  'lib/loops/two.ts': "import { one } from './one'\nexport const two: unknown = one",
  'lib/loops/alone.ts': 'export const alone = 1',
  'lib/loops/gone.ts': "import { gone } from './not-there'\nexport const here = gone",
  'lib/loops/tested.ts': "import { that } from '../../tests/that'\nexport const tested = that",
  'tests/that.ts': 'export const that = 1',
  'app/_ui/wire.tsx': "import { angle } from '../../lib/rules/angle'\nexport const wire = angle",
  'app/bay/_screens/list.tsx': "import { cars } from '../../../lib/cars/queries'\nexport const list = cars",
  'app/board/page.tsx': "import { db } from '../../db/client'\nexport default function Board() { return db }",
  'lib/pass/token.ts': "import { list } from '../contracts/list'\nexport const token = list",
  'lib/contracts/list.ts': "import { useCars } from '../cars/use-cars'\nexport const list = useCars",
  'lib/permissions/policy.ts': "import { ask } from '../platform/ask'\nexport const policy = ask",
  'lib/planning/bays.ts': "import { ask } from '../platform/ask'\nexport const bays = ask",
  'db/transaction.ts': "import { hold } from '../lib/holds/commands'\nexport const transaction = hold",
}

const reported = cruise(BREACHES)

test.each([
  ['rules-are-ground', 'lib/rules/angle.ts'],
  ['pure-imports-no-edge', 'lib/checklist/check.ts'],
  ['inspection-on-checklist', 'lib/inspection/fold.ts'],
  ['pure-imports-no-node', 'lib/inspection/fold.ts'],
  ['pass-is-pure', 'lib/pass/token.ts'],
  ['planning-is-pure', 'lib/planning/bays.ts'],
  ['permissions-are-pure', 'lib/permissions/policy.ts'],
  ['contracts-are-shapes', 'lib/contracts/list.ts'],
  ['sync-core', 'lib/sync/core/merge.ts'],
  ['sync-client', 'lib/sync/client/loop.ts'],
  ['nothing-imports-app', 'lib/sync/server/push.ts'],
  ['http', 'lib/http/server.ts'],
  ['platform', 'lib/platform/ask.ts'],
  ['ui-knows-no-domain', 'app/_ui/wire.tsx'],
  ['db-stands-below', 'db/transaction.ts'],
  ['features-apart', 'lib/people/queries.ts'],
  ['features-below-http-server', 'lib/holds/commands.ts'],
  ['db-from-few', 'lib/cars/model.ts'],
  ['db-from-few', 'app/board/page.tsx'],
  ['client-reaches-no-db', 'lib/cars/use-cars.ts'],
  ['client-reaches-no-db', 'app/bay/_screens/list.tsx'],
  ['no-cycles', 'lib/loops/one.ts'],
  ['no-orphans', 'lib/loops/alone.ts'],
  ['no-unresolvable', 'lib/loops/gone.ts'],
  ['no-tests-in-source', 'lib/loops/tested.ts'],
])('%s refuses what %s does', (rule, file) => {
  expect(reported).toContainEqual(`${rule} ${file}`)
})

test('a query may read the database, and nothing else is said of it', () => {
  expect(reported.filter((each) => each.endsWith(' lib/cars/queries.ts'))).toEqual([])
})

function cruise(files: Readonly<Record<string, string>>): readonly string[] {
  const folder = mkdtempSync(join(tmpdir(), 'lockwire-structure-'))
  try {
    for (const [name, text] of Object.entries({ ...files, 'tsconfig.json': '{ "compilerOptions": { "moduleResolution": "bundler" } }' })) {
      mkdirSync(dirname(join(folder, name)), { recursive: true })
      writeFileSync(join(folder, name), text)
    }
    symlinkSync(join(root, 'node_modules'), join(folder, 'node_modules'))
    const tool = join(root, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs')
    const args = [tool, '--config', join(root, '.dependency-cruiser.cjs'), '--output-type', 'json', 'app', 'lib', 'db']
    const { stdout, stderr } = spawnSync(process.execPath, args, { cwd: folder, encoding: 'utf8', maxBuffer: 50_000_000 })
    if (stdout === '') throw new Error(`dependency-cruiser said nothing: ${stderr}`)
    const { summary } = JSON.parse(stdout) as { summary: { violations: readonly { from: string; rule: { name: string } }[] } }
    return summary.violations.map(({ from, rule }) => `${rule.name} ${from}`)
  } finally {
    rmSync(folder, { recursive: true, force: true })
  }
}
