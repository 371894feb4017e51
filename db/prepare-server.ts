import 'server-only'
import { assertDatabase, UnfitDatabaseError } from './assert-database'
import { type Db, db } from './client'
import { migrateDatabase } from './migrate'

/** Migrates and checks the served database. Ends the process, with words, when it is not fit: a server that is up but may lose records is worse than none. */
export function prepareServer(): void {
  try {
    prepareDatabase(db)
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
    process.exit(1)
  }
}

/** Opens by `open`, migrates and checks. Throws `UnfitDatabaseError` for a file that is damaged, none of ours, or lacks what holds records. */
export function prepareDatabase(open: () => Db): Db {
  try {
    const database = open()
    migrateDatabase(database)
    assertDatabase(database)
    return database
  } catch (error) {
    if (isDamage(error)) throw new UnfitDatabaseError([`the file cannot be read as a database (${error.message})`])
    throw error
  }
}

function isDamage(error: unknown): error is Error {
  return error instanceof Error && 'code' in error && /^SQLITE_(NOTADB|CORRUPT)/.test(String(error.code))
}
