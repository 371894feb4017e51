import * as z from 'zod/mini'
import type { Contract } from '@/lib/contracts/contract'
import { CERTIFICATE_HEADER } from '@/lib/contracts/device-certificate'
import { DEVICE_TOKEN_LIFE_SECONDS, DEVICE_TOKEN_TYPE, type DeviceToken } from '@/lib/contracts/device-token'
import { live } from '@/lib/contracts/live'
import { problem } from '@/lib/contracts/problem'
import { syncPull } from '@/lib/contracts/sync-pull'
import { syncPush } from '@/lib/contracts/sync-push'
import { urlOf } from '@/lib/http/call'
import type { Enrolment } from './enrolment'
import { signJwsWith } from './device-key'
import { httpPhotos } from './http-photos'
import { readEventStream } from './read-event-stream'
import type { DayTools } from './day-tools'
import type { NoAnswer, SyncTransport, TransportReply } from './sync-transport'

/** A request that hangs longer than this on a paddock's network is as good as none, ms. */
const GIVE_UP_MS = 30_000

/** The way to the server over fetch, each request signed by the device (rule S5). */
export function httpTransport(enrolment: Enrolment, tools: Pick<DayTools, 'now' | 'sha256'>): SyncTransport {
  let offset = 0

  const headersFor = (method: Contract['method'], path: string, body: string) => signed(method, path, tools.sha256(body), body !== '')

  async function signed(method: Contract['method'], path: string, body: string, isJson = false): Promise<Record<string, string>> {
    const iat = Math.floor((tools.now() + offset) / 1000)
    const { device, event } = enrolment.says
    const token: DeviceToken = { device, event, method, path, iat, exp: iat + DEVICE_TOKEN_LIFE_SECONDS, body }
    return {
      authorization: `Device ${await signJwsWith(enrolment.key, DEVICE_TOKEN_TYPE, device, token)}`,
      [CERTIFICATE_HEADER]: enrolment.certificate,
      ...(isJson ? { 'content-type': 'application/json' } : {}),
    }
  }

  async function ask<T>(contract: Contract, response: z.ZodMiniType<T>, query: object, body: object | null): Promise<TransportReply<T>> {
    const path = urlOf(contract, {}, query)
    const text = body === null ? '' : JSON.stringify(body)
    try {
      const answer = await fetch(path, {
        method: contract.method,
        credentials: 'omit',
        cache: 'no-store',
        redirect: 'error',
        headers: await headersFor(contract.method, path, text),
        ...(body === null ? {} : { body: text }),
        signal: AbortSignal.timeout(GIVE_UP_MS),
      })
      return await readAnswer(answer, response)
    } catch {
      // No network, a redirect to somebody's sign-in page, a cut answer, or time is up: nothing was heard (rule S6).
      return { state: 'unanswered', why: 'offline', serverTime: null }
    }
  }

  return {
    push: (request) => ask(syncPush, syncPush.response, {}, request),
    ...httpPhotos(signed, tools.sha256('')),
    pull: (query) => ask(syncPull, syncPull.response, query, null),
    setOffset: (next) => {
      offset = next
    },
    live: ({ onOpen, onPoke, onEnd }) => {
      const stop = new AbortController()
      const path = urlOf(live, { event: enrolment.says.event }, {})
      void (async () => {
        try {
          const answer = await fetch(path, {
            cache: 'no-store',
            redirect: 'error',
            headers: await headersFor('GET', path, ''),
            signal: stop.signal,
          })
          if (answer.ok && answer.body !== null) {
            onOpen()
            await readEventStream(answer.body, onPoke)
          }
        } catch (error) {
          if (stop.signal.aborted) return
          // Why it broke changes nothing: polling goes on and the stream is tried again (rule S8). A bug of ours would be one here too.
          if (!(error instanceof TypeError) && !(error instanceof DOMException)) throw error
        }
        if (!stop.signal.aborted) onEnd()
      })()
      return () => stop.abort()
    },
  }
}

async function readAnswer<T>(answer: Response, shape: z.ZodMiniType<T>): Promise<TransportReply<T>> {
  if (answer.status === 413 || answer.status === 422) return { state: 'too-much', status: answer.status }
  const json: unknown = await answer.json().catch(() => null)
  if (answer.ok) {
    const read = z.safeParse(shape, json)
    return read.success ? { state: 'answered', value: read.data } : { state: 'unanswered', why: 'not-our-server', serverTime: null }
  }
  const said = problem.safeParse(json)
  if (!said.success) return { state: 'unanswered', why: 'not-our-server', serverTime: null }
  return { state: 'unanswered', why: reasonOf(answer.status), serverTime: said.data.serverTime || null }
}

function reasonOf(status: number): NoAnswer {
  if (status === 426) return 'too-old'
  if (status === 507) return 'no-room'
  if (status === 429 || status === 503) return 'busy'
  return status === 401 || status === 403 || status === 404 ? 'refused' : 'fault'
}
