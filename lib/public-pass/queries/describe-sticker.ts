import 'server-only'
import { and, eq } from 'drizzle-orm'
import { verify } from 'node:crypto'
import type { Db } from '@/db/client'
import { device, event, issuedPass } from '@/db/schema'
import type { SubjectState } from '@/lib/inspection/state'
import { passId, type PassPayload } from '@/lib/pass/pass-payload'
import { readQrText } from '@/lib/pass/qr-text'
import { decodeToken, type DecodedToken } from '@/lib/pass/token'
import { verifyToken, type VerifySignature } from '@/lib/pass/verify-token'
import { ed25519Key } from '@/lib/platform/jws'
import { serverPublicKey } from '@/lib/platform/server-key'
import { venueDay } from '@/lib/rules/venue-day'
import type { Sticker } from '../sticker'
import { type Reported, stickerOf } from '../sticker-of'

/** Reads an event's log, as the route hands it in; null where there is no such event. */
export type ReadStates = (database: Db, eventId: string, now: number) => { readonly stateOf: (subjectKey: string) => SubjectState } | null

type EventRow = typeof event.$inferSelect

const NOT_OURS: Sticker = { is: 'not-ours' }

/** What a sticker says to anybody. Whatever the text is, it is judged and never followed; what no key of ours signed is *not ours*. */
export async function describeSticker(database: Db, text: string, readStates: ReadStates, now: number): Promise<Sticker> {
  const read = readQrText(text)
  if (read.kind === 'foreign') return NOT_OURS
  const decoded = decodeToken(read.token)
  if (!decoded.ok) return NOT_OURS
  const { payload } = decoded.token
  const own = await signerEvent(database, decoded.token)
  if (own === null) return NOT_OURS
  const today = venueDay(now, own.timeZone)
  return stickerOf(payload, { name: own.name, venue: own.venue, today }, reportedPass(database, own, payload, readStates, now))
}

/** The event whose device of that number signed it. Clubs number their events each for itself, so the signature decides. */
async function signerEvent(database: Db, token: DecodedToken): Promise<EventRow | null> {
  const candidates = database.select().from(event).where(eq(event.code, token.payload.event)).all()
  for (const candidate of candidates) {
    const key = publicKeyOf(database, candidate, token.payload.kid)
    if (key !== null && (await verifyToken(token, key, verifyOnServer))) return candidate
  }
  return null
}

function publicKeyOf(database: Db, row: EventRow, kid: number): Uint8Array<ArrayBuffer> | null {
  const known = kid === 0 ? serverPublicKey(database, row.clubId) : deviceKey(database, row.id, kid)
  return known === null ? null : new Uint8Array(Buffer.from(known, 'base64url'))
}

function deviceKey(database: Db, eventId: string, kid: number): string | null {
  const row = database
    .select({ publicKey: device.publicKey })
    .from(device)
    .where(and(eq(device.eventId, eventId), eq(device.kid, kid)))
    .get()
  return row?.publicKey ?? null
}

const verifyOnServer: VerifySignature = async (publicKey, message, signature) => {
  const key = ed25519Key(Buffer.from(publicKey).toString('base64url'))
  return key !== null && verify(null, message, key, signature)
}

function reportedPass(database: Db, own: EventRow, payload: PassPayload, readStates: ReadStates, now: number): Reported | null {
  const rows = database
    .select({ hash: issuedPass.recordHash, subjectKey: issuedPass.subjectKey })
    .from(issuedPass)
    .where(and(eq(issuedPass.eventId, own.id), eq(issuedPass.passId, passId(payload))))
    .all()
  const states = rows.length === 0 ? null : readStates(database, own.id, now)
  const reported = rows.flatMap(({ hash, subjectKey }) => {
    const subject = states?.stateOf(subjectKey)
    const pass = subject?.passes.find((each) => each.hash === hash)
    return subject && pass ? [{ pass, subject }] : []
  })
  // One id named by two records can only be a fault or a forgery: the worse of them counts.
  return reported.find(({ pass }) => pass.state !== 'live') ?? reported[0] ?? null
}
