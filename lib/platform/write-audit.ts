import 'server-only'
import type { Db } from '@/db/client'
import { audit } from '@/db/schema'
import { newId } from './ids'

/** Writes who did what outside the log; inside the transaction that does it. No names or addresses in the detail: it can never be erased. */
export function writeAudit(tx: Db, row: Omit<typeof audit.$inferInsert, 'id'>): void {
  tx.insert(audit)
    .values({ ...row, id: newId() })
    .run()
}
