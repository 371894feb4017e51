import 'server-only'
import type { Db } from '@/db/client'
import { transaction } from '@/db/transaction'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { enrolDevice } from '@/lib/contracts/devices'
import type { AccountActor, Nobody } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { ed25519Key } from '@/lib/platform/jws'
import { announce } from '@/lib/platform/live'
import { isRefusal, type Refusal, refuse } from '@/lib/platform/refusal'
import { serverKey } from '@/lib/platform/server-key'
import { enrolleeByAccount } from './enrollee-by-account'
import { enrolleeByClaim } from './enrollee-by-claim'
import { keepDevice } from './keep-device'

/**
 * Gives a device its number and the certificate of its key (rule M2), for the person who is signed in or whose claim was accepted.
 * Asked again with the same key it is the same device: another person is added to it, changed roles are certified anew.
 */
export function enrol(
  { body }: InputOf<typeof enrolDevice>,
  actor: AccountActor | Nobody,
  { database, now }: Pick<Deps, 'database' | 'now'>,
): OutputOf<typeof enrolDevice> | Refusal {
  if (!ed25519Key(body.publicKey)) return refuse('invalid', { issues: [{ path: 'publicKey', message: 'not an Ed25519 public key' }] })
  const result = transaction(database, (tx) => {
    const enrollee = findEnrollee(tx, body, actor)
    if (isRefusal(enrollee)) return enrollee
    const kept = keepDevice(tx, enrollee, { name: body.name, publicKey: body.publicKey }, now)
    if (isRefusal(kept)) return kept
    return { ...kept, serverPublicKey: serverKey(tx, enrollee.event.clubId).publicKey, serverTime: now }
  })
  if (!isRefusal(result)) announce(body.event)
  return result
}

function findEnrollee(tx: Db, body: InputOf<typeof enrolDevice>['body'], actor: AccountActor | Nobody) {
  if (body.claim !== undefined) return enrolleeByClaim(tx, body.event, body.claim, body.publicKey)
  return actor.kind === 'account' ? enrolleeByAccount(tx, body.event, actor) : refuse('not-signed-in')
}
