import 'server-only'
import { eq } from 'drizzle-orm'
import { createPrivateKey, generateKeyPairSync, type KeyObject } from 'node:crypto'
import type { Db } from '@/db/client'
import { serverKey as serverKeyTable } from '@/db/schema'
import { transaction } from '@/db/transaction'

export interface ServerKey {
  /** Raw Ed25519 public key, base64url. */
  readonly publicKey: string
  readonly privateKey: KeyObject
}

/** The club's own signing key, made when it is first needed and kept in the database: a restored backup must know it, or no certificate holds. */
export function serverKey(database: Db, clubId: string): ServerKey {
  return transaction(database, () => {
    const row = database.select().from(serverKeyTable).where(eq(serverKeyTable.clubId, clubId)).get()
    if (row) {
      const privateKey = createPrivateKey({ key: Buffer.from(row.privateKey, 'base64'), format: 'der', type: 'pkcs8' })
      return { publicKey: row.publicKey, privateKey }
    }
    const pair = generateKeyPairSync('ed25519')
    const publicKey = pair.publicKey.export({ format: 'jwk' }).x
    if (!publicKey) throw new Error('an Ed25519 key without x')
    const privateKey = pair.privateKey.export({ format: 'der', type: 'pkcs8' }).toString('base64')
    database.insert(serverKeyTable).values({ clubId, publicKey, privateKey }).run()
    return { publicKey, privateKey: pair.privateKey }
  })
}

/** The club's public key without making one; null before the first enrolment. */
export function serverPublicKey(database: Db, clubId: string): string | null {
  const row = database.select({ publicKey: serverKeyTable.publicKey }).from(serverKeyTable).where(eq(serverKeyTable.clubId, clubId)).get()
  return row?.publicKey ?? null
}
