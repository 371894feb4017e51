import 'server-only'
import type { Db } from './client'

/**
 * Runs `work` in one transaction that takes the write lock at once (BEGIN IMMEDIATE), so that what it reads is still true when it writes.
 * Synchronous by type: with better-sqlite3 an async callback would commit before its first await. Throws what `work` throws, with nothing kept.
 */
export function transaction<T>(database: Db, work: (tx: Db) => T extends PromiseLike<unknown> ? never : T): T {
  // Nested calls join the outer transaction: its commit is the only one that counts.
  if (database.$client.inTransaction) return work(database)
  return database.$client.transaction(() => work(database) as T).immediate()
}
