import { spawnSync } from 'node:child_process'
import { join, resolve } from 'node:path'

const root = resolve(import.meta.dirname, '../..')

/** Fills a new database file with the demo event, by the same script the demo runs. */
export function seedBenchDatabase(file: string): void {
  const tsx = join(root, 'node_modules/tsx/dist/cli.mjs')
  const made = spawnSync(process.execPath, [tsx, '--conditions=react-server', join(root, 'db/seed.ts')], {
    cwd: root,
    env: { ...process.env, LOCKWIRE_DB: file, LOCKWIRE_ORIGIN: 'http://localhost:3000' },
    encoding: 'utf8',
  })
  if (made.status !== 0) throw new Error(`the seed failed: ${made.stderr}`)
}
