import { generateKeyPairSync, type KeyObject, randomUUID, sign } from 'node:crypto'
import type { Db } from '@/db/client'
import { account, club, crewMember, event, person, checklistText, limitsText } from '@/db/schema'
import type { CrewRole } from '@/lib/permissions/policy'
import { newId } from '@/lib/platform/ids'
import { hashPassword } from '@/lib/platform/password'
import { sha256 } from '@/lib/platform/sha256'

export const PASSWORD = 'a lock is wired twice'
let passwordHash: Promise<string> | null = null

/** A club with one event and an organiser; further accounts by role. */
export async function aClub(database: Db, name = 'Marram Track Days') {
  passwordHash ??= hashPassword(PASSWORD)
  const stored = await passwordHash
  const clubId = newId()
  database.insert(club).values({ id: clubId, name }).run()
  const addAccount = (role: 'admin' | 'organiser' | 'entrant' | CrewRole, email: string) => {
    const id = newId()
    const roles = role === 'admin' || role === 'organiser' || role === 'entrant' ? [role] : []
    database
      .insert(account)
      .values({ id, clubId, email, name: `The ${role}`, passwordHash: stored, roles, createdAt: 0 })
      .run()
    return id
  }
  const addEvent = (code = 1) => {
    const id = newId()
    database.insert(checklistText).values({ hash: 'c', body: '{}' }).onConflictDoNothing().run()
    database.insert(limitsText).values({ hash: 'l', body: '{}' }).onConflictDoNothing().run()
    database
      .insert(event)
      .values({
        id,
        clubId,
        code,
        name: `Day ${code}`,
        venue: 'Ottermere Ring',
        timeZone: 'Europe/London',
        firstDay: '2026-05-09',
        lastDay: '2026-05-10',
        checklistHash: 'c',
        limitsHash: 'l',
        defaultDepth: 'standard',
        depthPolicy: 'all',
        listStaleMinutes: 30,
        nextKid: 1,
        nextEntryCode: 1,
        snapshotVersion: 1,
        createdAt: 0,
      })
      .run()
    return id
  }
  const addCrew = (eventId: string, accountId: string, role: CrewRole) => {
    const personId = newId()
    const owner = { clubId, eventId }
    database
      .insert(person)
      .values({ ...owner, id: personId, accountId, name: `The ${role}` })
      .run()
    database
      .insert(crewMember)
      .values({ ...owner, id: newId(), personId, role, state: 'accepted', askedAt: 0 })
      .run()
    return personId
  }
  return { clubId, addAccount, addEvent, addCrew }
}

/** A phone with its own key, that signs requests as an enrolled device does. */
export function aPhone() {
  const pair = generateKeyPairSync('ed25519')
  return { publicKey: pair.publicKey.export({ format: 'jwk' }).x ?? '', privateKey: pair.privateKey }
}

interface Claims {
  readonly device: string
  readonly event: string
  readonly method: string
  readonly path: string
  readonly nowMs: number
  readonly body?: string | Uint8Array
  readonly lifeSeconds?: number
}

/** A request token made independently of the code that reads it. */
export function aToken(
  privateKey: KeyObject,
  { device, event: eventId, method, path, nowMs, body = '', lifeSeconds = 60 }: Claims,
): string {
  const iat = Math.floor(nowMs / 1000)
  const claims = { device, event: eventId, method, path, iat, exp: iat + lifeSeconds, body: sha256(body) }
  return aJws(privateKey, { alg: 'EdDSA', typ: 'lockwire-request' }, claims)
}

export function aJws(privateKey: KeyObject, header: object, payload: object): string {
  const text = [header, payload].map((part) => Buffer.from(JSON.stringify(part)).toString('base64url')).join('.')
  return `${text}.${sign(null, Buffer.from(text), privateKey).toString('base64url')}`
}

/** An id that nothing has. */
export function noSuchId(): string {
  return randomUUID()
}
