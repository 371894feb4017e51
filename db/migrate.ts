import 'server-only'
import { migrate } from 'drizzle-orm/better-sqlite3/migrator'
import { resolve } from 'node:path'
import type { Db } from './client'

/** Brings the file up to this build's tables and triggers. Throws, with nothing half done, when a step fails. */
export function migrateDatabase(database: Db, folder: string = resolve(process.cwd(), 'db/migrations')): void {
  migrate(database, { migrationsFolder: folder })
}
