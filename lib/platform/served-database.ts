import 'server-only'
import { type Db, db } from '@/db/client'

/** The database this server serves, for the door and for pages; commands get it in their deps. */
export function servedDatabase(): Db {
  return db()
}

export type { Db }
