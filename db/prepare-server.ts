import 'server-only'
import { assertDatabase } from './assert-database'
import { db } from './client'
import { migrateDatabase } from './migrate'

/** Migrates and checks the served database. Ends the process, with words, when it is not fit: a server that is up but may lose records is worse than none. */
export function prepareServer(): void {
  try {
    const database = db()
    migrateDatabase(database)
    assertDatabase(database)
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
    process.exit(1)
  }
}
