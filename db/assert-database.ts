import 'server-only'
import type { Db } from './client'

/** Tables that nobody may change or tidy, and the triggers that hold it. */
const APPEND_ONLY = ['record', 'scan', 'audit', 'declaration'] as const
const TRIGGERS = [...APPEND_ONLY.flatMap((table) => [`${table}_no_update`, `${table}_no_delete`, `${table}_no_replace`]), 'record_gapless']

const PRAGMAS = [
  { name: 'journal_mode', value: 'wal', inMemory: 'memory' },
  { name: 'synchronous', value: 2, inMemory: 2 },
  { name: 'foreign_keys', value: 1, inMemory: 1 },
  { name: 'busy_timeout', value: 5000, inMemory: 5000 },
  { name: 'recursive_triggers', value: 1, inMemory: 1 },
] as const

/** The database is not one that records may be trusted to; the message says each thing that is wrong and what to do. */
export class UnfitDatabaseError extends Error {
  override readonly name = 'UnfitDatabaseError'
  constructor(readonly faults: readonly string[]) {
    super(
      `Lockwire does not serve from this database, because a record could be lost or changed in it:\n${faults.map((fault) => `  - ${fault}`).join('\n')}\n` +
        'Nothing was changed. Restore the last good backup, or bring the tables and triggers back as db/migrations says, and start again.',
    )
  }
}

/** Throws `UnfitDatabaseError` unless file, pragmas, STRICT tables and append-only triggers are all as they must be. */
export function assertDatabase(database: Db): void {
  const faults = [...damage(database), ...pragmaFaults(database), ...tableFaults(database), ...triggerFaults(database)]
  if (faults.length > 0) throw new UnfitDatabaseError(faults)
}

function damage(database: Db): readonly string[] {
  const result = database.$client.pragma('quick_check(1)', { simple: true })
  return result === 'ok' ? [] : [`the file is damaged (${String(result)})`]
}

function pragmaFaults(database: Db): readonly string[] {
  return PRAGMAS.flatMap(({ name, value, inMemory }) => {
    const expected = database.$client.memory ? inMemory : value
    const actual = database.$client.pragma(name, { simple: true })
    return actual === expected ? [] : [`pragma ${name} is ${String(actual)}, must be ${expected}`]
  })
}

function tableFaults(database: Db): readonly string[] {
  const tables = database.$client
    .prepare<[], { name: string; strict: number }>("SELECT name, strict FROM pragma_table_list WHERE schema = 'main' AND type = 'table'")
    .all()
    .filter(({ name }) => !name.startsWith('sqlite_') && name !== '__drizzle_migrations')
  if (tables.length === 0) return ['it has no tables; the migrations have not run']
  return tables.filter(({ strict }) => strict !== 1).map(({ name }) => `table ${name} is not STRICT`)
}

function triggerFaults(database: Db): readonly string[] {
  const found = database.$client
    .prepare<[], { name: string; sql: string }>("SELECT name, sql FROM sqlite_master WHERE type = 'trigger'")
    .all()
    // An emptied body would keep its name: what it does is looked for too.
    .filter(({ sql }) => sql.includes('RAISE(ABORT'))
    .map(({ name }) => name)
  return TRIGGERS.filter((trigger) => !found.includes(trigger)).map((trigger) => `trigger ${trigger} is missing`)
}
