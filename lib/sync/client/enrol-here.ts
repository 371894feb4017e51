import { enrolDevice } from '@/lib/contracts/devices'
import { deviceCertificate } from '@/lib/contracts/device-certificate'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'
import { parseJws } from '../core/jws-parse'
import { makeDeviceKey, type DeviceKey } from './device-key'
import type { DeviceStore } from './device-store'
import { KEYS, type Enrolment } from './enrolment'

/** What to enrol this browser for: by the sign-in of who is signed in, or by the claim of an accepted joiner. */
export interface EnrolRequest {
  readonly event: string
  /** As the organiser will see it: "tablet at the noise stand". */
  readonly name: string
  readonly claim?: string
}

/** One line of the phone's own list of what it is enrolled for. */
export interface EnrolledHere {
  readonly event: string
  readonly device: string
  readonly name: string
  readonly at: number
}

export type EnrolOutcome = { readonly ok: true; readonly enrolled: EnrolledHere } | { readonly ok: false; readonly problem: Problem }

/** The stores of one browser: its own small one, and one for each device it is. */
export interface BrowserStores {
  readonly phone: () => Promise<DeviceStore>
  readonly device: (event: string, device: string) => Promise<DeviceStore>
}

/**
 * Makes this browser a crew device of an event (rule M2): the key is made here and kept before the server is asked, so that an answer that was lost is asked
 * for again with the same key and gives the same device. Rejects only when this device's own storage fails.
 */
export async function enrolHere(request: EnrolRequest, stores: BrowserStores, now: number): Promise<EnrolOutcome> {
  const phone = await stores.phone()
  try {
    const pending = `pending:${request.event}`
    const key =
      (await keyHere(request.event, phone, stores)) ?? ((await phone.read(pending)) as DeviceKey | undefined) ?? (await makeDeviceKey())
    await phone.commit({ put: [[pending, key]] })
    const body = {
      event: request.event,
      name: request.name,
      publicKey: key.publicKey,
      ...(request.claim === undefined ? {} : { claim: request.claim }),
    }
    const answer = await call(enrolDevice, { body })
    if (!answer.ok) return { ok: false, problem: answer.problem }
    const { certificate, device } = answer.value
    const says = deviceCertificate.parse(parseJws(certificate)?.payload)
    const enrolment: Enrolment = { certificate, says, key }
    const store = await stores.device(request.event, device)
    await store.commit({ put: [[KEYS.enrolment, enrolment]] })
    store.close()
    const enrolled: EnrolledHere = { event: request.event, device, name: says.deviceName, at: now }
    // Only now may the key's first copy go: the device's own store holds it for good.
    await phone.commit({ put: [[`device:${device}`, enrolled]], remove: [pending] })
    return { ok: true, enrolled }
  } finally {
    phone.close()
  }
}

/** The key this browser already has for the event: a second person on one tablet joins its device, or its log would fall in two. */
async function keyHere(event: string, phone: DeviceStore, stores: BrowserStores): Promise<DeviceKey | null> {
  const rows = (await phone.list('device:')).map(([, value]) => value as EnrolledHere)
  const known = rows.find((row) => row.event === event)
  if (known === undefined) return null
  const store = await stores.device(event, known.device)
  const enrolment = (await store.read(KEYS.enrolment)) as Enrolment | undefined
  store.close()
  return enrolment?.key ?? null
}

/** What this browser is enrolled for, the latest first. */
export async function enrolledHere(stores: BrowserStores): Promise<readonly EnrolledHere[]> {
  const phone = await stores.phone()
  const rows = await phone.list('device:')
  phone.close()
  return rows.map(([, value]) => value as EnrolledHere).sort((a, b) => b.at - a.at)
}
