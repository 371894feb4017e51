import 'server-only'
import { eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { event } from '@/db/schema'
import { CERTIFICATE_TYPE, type DeviceCertificate, deviceCertificate } from '@/lib/contracts/device-certificate'
import { verifyJws } from './jws'
import { serverPublicKey } from './server-key'

/** What an enrolment certificate says, if the key of the event's own club signed it for this event; null otherwise. */
export function readCertificate(database: Db, eventId: string, jws: string): DeviceCertificate | null {
  const owner = database.select({ clubId: event.clubId }).from(event).where(eq(event.id, eventId)).get()
  const key = owner ? serverPublicKey(database, owner.clubId) : null
  if (!key) return null
  const read = deviceCertificate.safeParse(verifyJws(jws, CERTIFICATE_TYPE, key))
  return read.success && read.data.event === eventId ? read.data : null
}
