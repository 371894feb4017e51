import 'server-only'
import { type KeyObject, verify } from 'node:crypto'
import type { Db } from '@/db/client'
import { deviceCertificate, CERTIFICATE_TYPE } from '@/lib/contracts/device-certificate'
import type { AnyRecord } from '@/lib/inspection/record'
import type { DeviceActor } from '@/lib/platform/actor'
import { adoptDevice } from '@/lib/platform/adopt-device'
import { deviceActor } from '@/lib/platform/device-actor'
import { ed25519Key, unverifiedPayload, verifyJws } from '@/lib/platform/jws'
import { serverPublicKey } from '@/lib/platform/server-key'
import { sha256 } from '@/lib/platform/sha256'
import { parseJws, type ParsedJws } from '../core/jws-parse'
import { readRecord } from '../core/read-record'
import { RECORD_TYPE } from '../core/record-type'

/** A record may not be longer than this, in characters of its JWS. */
export const LONGEST_JWS = 32_768

/** A record whose signature holds, with the device that vouches for it: null where the key is nobody's this server knows. */
export interface VerifiedRecord {
  readonly state: 'verified'
  readonly jws: string
  readonly hash: string
  readonly record: AnyRecord
  readonly device: DeviceActor | null
}

export interface RefusedRecord {
  readonly state: 'refused'
  readonly hash: string
  readonly id: string | null
  readonly code: 'too-large' | 'unreadable' | 'wrong-event' | 'unknown-device' | 'bad-signature'
}

/** Everything about an event's devices that verifying needs. */
interface Signer {
  readonly device: DeviceActor | null
  readonly key: KeyObject
}

const keys = new Map<string, KeyObject | null>()

/** Reads and verifies each record by itself, before any transaction: a bad one never touches the rest. In the order given. */
export async function verifyRecords(
  database: Db,
  pusher: DeviceActor,
  jwss: readonly string[],
  certificates: readonly string[],
  now: number,
): Promise<readonly (VerifiedRecord | RefusedRecord)[]> {
  const { eventId, clubId } = pusher
  // Who pushes was read from the rows a moment ago, at the door.
  const signers = new Map<string, Signer | null>([[pusher.deviceId, signer(pusher, pusher.publicKey)]])
  function signerOf(device: string): Signer | null {
    const known = signers.get(device)
    if (known !== undefined) return known
    const found = findSigner(database, eventId, clubId, device, certificates, now)
    signers.set(device, found)
    return found
  }
  return Promise.all(jwss.map((jws) => verifyRecord(jws, eventId, signerOf)))
}

async function verifyRecord(
  jws: string,
  eventId: string,
  signerOf: (device: string) => Signer | null,
): Promise<VerifiedRecord | RefusedRecord> {
  const hash = sha256(jws)
  if (jws.length > LONGEST_JWS) return { state: 'refused', hash, id: null, code: 'too-large' }
  const parsed = parseJws(jws)
  const id = typeof parsed?.payload.id === 'string' ? parsed.payload.id.slice(0, 36) : null
  if (parsed?.header.alg !== 'EdDSA' || parsed.header.typ !== RECORD_TYPE) return { state: 'refused', hash, id, code: 'unreadable' }
  const record = readRecord(parsed.payload)
  if (record === null) return { state: 'refused', hash, id, code: 'unreadable' }
  if (record.event !== eventId) return { state: 'refused', hash, id, code: 'wrong-event' }
  const signer = signerOf(record.device)
  if (signer === null) return { state: 'refused', hash, id, code: 'unknown-device' }
  if (!(await isSignedBy(parsed, signer.key))) return { state: 'refused', hash, id, code: 'bad-signature' }
  return { state: 'verified', jws, hash, record, device: signer.device }
}

// The callback form runs on the thread pool: a batch verifies on all cores while this thread reads the next record.
function isSignedBy({ signingInput, signature }: ParsedJws, key: KeyObject): Promise<boolean> {
  if (signature.length !== 64) return Promise.resolve(false)
  return new Promise((resolve, reject) => {
    verify(null, Buffer.from(signingInput), key, signature, (error, holds) => (error === null ? resolve(holds) : reject(error)))
  })
}

function findSigner(
  database: Db,
  eventId: string,
  clubId: string,
  id: string,
  certificates: readonly string[],
  now: number,
): Signer | null {
  const known = deviceActor(database, id)
  if (known !== null) return known.eventId === eventId ? signer(known, known.publicKey) : null
  for (const jws of certificates) {
    const says = deviceCertificate.safeParse(unverifiedPayload(jws))
    if (!says.success || says.data.device !== id || says.data.event !== eventId) continue
    const serverKey = serverPublicKey(database, clubId)
    const isOurs = serverKey !== null && verifyJws(jws, CERTIFICATE_TYPE, serverKey) !== null
    if (!isOurs) return signer(null, says.data.publicKey)
    // A restored server has forgotten this device: its certificate brings it back (rule M2).
    if (adoptDevice(database, says.data, jws, now)) return signer(deviceActor(database, id), says.data.publicKey)
  }
  return null
}

function signer(device: DeviceActor | null, publicKey: string): Signer | null {
  let key = keys.get(publicKey)
  if (key === undefined) {
    key = ed25519Key(publicKey)
    if (keys.size > 2_000) keys.clear()
    keys.set(publicKey, key)
  }
  return key === null ? null : { device, key }
}
