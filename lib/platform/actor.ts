import type { Role } from '@/lib/permissions/policy'

/** Somebody who is signed in. */
export interface AccountActor {
  readonly kind: 'account'
  readonly accountId: string
  readonly clubId: string
  readonly name: string
  /** Roles in the whole club; those at one event come from `rolesAt`. */
  readonly clubRoles: readonly Role[]
  /** SHA-256 of the sign-in's id. */
  readonly signInHash: string
}

/** An enrolled device, by its signed request token. */
export interface DeviceActor {
  readonly kind: 'device'
  readonly deviceId: string
  readonly clubId: string
  readonly eventId: string
  readonly kid: number
  /** Raw Ed25519 public key, base64url. */
  readonly publicKey: string
  readonly state: 'active' | 'retired' | 'lost'
  readonly lastGoodSeq: number | null
  readonly people: readonly DevicePerson[]
}

export interface DevicePerson {
  readonly personId: string
  /** As certified at enrolment. */
  readonly enrolledRoles: readonly Role[]
  /** Those of them that still stand. */
  readonly roles: readonly Role[]
}

export interface Nobody {
  readonly kind: 'nobody'
}

export type Actor = AccountActor | DeviceActor | Nobody
