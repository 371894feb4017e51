import 'server-only'
import Database from 'better-sqlite3'
import { type BetterSQLite3Database, drizzle } from 'drizzle-orm/better-sqlite3'
import { mkdirSync } from 'node:fs'
import { dirname } from 'node:path'
import { env } from '@/lib/platform/env'
import * as schema from './schema'

/** The database with all its tables; `$client` is the raw handle for prepared statements. */
export type Db = BetterSQLite3Database<typeof schema> & { readonly $client: Database.Database }

// Next bundles instrumentation and every route apart, so a module variable would open the file once a bundle.
const holder = globalThis as typeof globalThis & { lockwireDatabase?: Db }

/** The database this server serves, opened at first use from `LOCKWIRE_DB`. */
export function db(): Db {
  holder.lockwireDatabase ??= openDatabase(env().databaseFile)
  return holder.lockwireDatabase
}

/** Opens a file (or `:memory:`) with the pragmas that `assertDatabase` later insists on. Makes the folder where it is missing. */
export function openDatabase(file: string): Db {
  if (file !== ':memory:') mkdirSync(dirname(file), { recursive: true })
  const client = new Database(file)
  client.pragma('journal_mode = WAL')
  // better-sqlite3's default in WAL is NORMAL: an acknowledged commit can vanish on power loss.
  client.pragma('synchronous = FULL')
  client.pragma('foreign_keys = ON')
  client.pragma('busy_timeout = 5000')
  // Without it INSERT OR REPLACE deletes a row past its no-delete trigger.
  client.pragma('recursive_triggers = ON')
  return drizzle({ client, schema })
}

/** Makes this database the one `db()` gives; for tests and scripts that open their own. */
export function useDatabase(database: Db): void {
  holder.lockwireDatabase = database
}
