import { signJwsWith } from '@/lib/sync/client/device-key'
import type { Enrolment } from '@/lib/sync/client/enrolment'
import type { SyncPushResponse } from '@/lib/contracts/sync-push'
import { RECORD_TYPE } from '@/lib/sync/core/record-type'
import { newId } from '@/lib/platform/ids'
import { MORNING, type Phone } from './sync-paddock'

let made = 0

/** A record's payload as a device of this phone would make it, whether it may or not: for what the client itself would never save. */
export function payload(phone: Phone, event: string, said: object): Record<string, unknown> {
  made += 1
  return {
    v: 1,
    id: newId(),
    event,
    device: phone.deviceId,
    deviceSeq: made,
    actor: phone.people[0],
    at: MORNING + made,
    offset: 0,
    day: '2026-05-09',
    seen: 0,
    basis: [],
    answers: [],
    shown: { number: '47', plateTail: '11KLM' },
    ...said,
  }
}

/** Signs a payload with the phone's own key. */
export function signed(phone: Phone, body: object, type = RECORD_TYPE): Promise<string> {
  const { key } = phone.disk.values.get('enrolment') as Enrolment
  return signJwsWith(key, type, phone.deviceId, body)
}

/** Pushes these texts as they are; gives the answers. */
export async function pushRaw(
  phone: Phone,
  event: string,
  records: readonly string[],
  more: { readonly certificates?: readonly string[]; readonly notes?: readonly { hash: string; salt: string; text: string }[] } = {},
): Promise<SyncPushResponse['answers']> {
  const { certificate } = phone.disk.values.get('enrolment') as Enrolment
  const reply = await phone.network.transport.push({
    protocol: 1,
    event,
    certificates: [certificate, ...(more.certificates ?? [])],
    records: [...records],
    notes: [...(more.notes ?? [])],
    unsent: records.length,
  })
  if (reply.state !== 'answered') throw new Error(`no answer: ${JSON.stringify(reply)}`)
  return reply.value.answers
}
