import { getPhoto, putPhoto } from '@/lib/contracts/photos'
import { problem } from '@/lib/contracts/problem'
import { urlOf } from '@/lib/http/call'
import type { PhotoReply, SyncTransport } from './sync-transport'

/** A photograph may need long where a page hardly loads, ms. */
const GIVE_UP_MS = 120_000
/** What the server says of the photograph itself, and will say again however often it is sent. */
const REFUSED: readonly string[] = ['photo-not-one', 'photo-unreadable', 'photo-too-many-pixels', 'too-large']

/** Signs a request whose body has this SHA-256. */
export type SignedHeaders = (method: 'GET' | 'PUT', path: string, bodyHash: string) => Promise<Record<string, string>>

/** The photographs' way to the server and back, each request signed by the device. */
export function httpPhotos(headersFor: SignedHeaders, emptyHash: string): Pick<SyncTransport, 'putPhoto' | 'getPhoto'> {
  async function ask(method: 'GET' | 'PUT', hash: string, body: Uint8Array<ArrayBuffer> | null): Promise<Response | null> {
    const path = urlOf(method === 'PUT' ? putPhoto : getPhoto, { hash }, {})
    try {
      return await fetch(path, {
        method,
        credentials: 'omit',
        redirect: 'error',
        headers: await headersFor(method, path, body === null ? emptyHash : hash),
        ...(body === null ? {} : { body: new Blob([body], { type: 'image/jpeg' }) }),
        signal: AbortSignal.timeout(GIVE_UP_MS),
      })
    } catch {
      // No network, somebody's sign-in page, or time is up: nothing was heard, and it stays where it is.
      return null
    }
  }

  return {
    putPhoto: async (hash, bytes) => replyOf(await ask('PUT', hash, bytes), hash),
    getPhoto: async (hash) => {
      const answer = await ask('GET', hash, null)
      if (answer?.ok !== true || answer.headers.get('content-type') !== 'image/jpeg') return null
      return answer.blob().catch(() => null)
    },
  }
}

async function replyOf(answer: Response | null, hash: string): Promise<PhotoReply> {
  const json: unknown = await answer?.json().catch(() => null)
  if (answer?.ok === true) {
    const kept = putPhoto.response.safeParse(json)
    return kept.success && kept.data.hash === hash ? { state: 'kept' } : { state: 'unanswered' }
  }
  const said = problem.safeParse(json)
  return said.success && REFUSED.includes(said.data.code) ? { state: 'refused', code: said.data.code } : { state: 'unanswered' }
}
