import 'server-only'
import { type Refusal, refuse } from '@/lib/platform/refusal'

/** The request's body, read no further than the limit: what says it is larger, or turns out larger on the way, is refused. */
export async function readBody(request: Request, limitBytes: number): Promise<Uint8Array | Refusal> {
  const announced = Number(request.headers.get('content-length') ?? '0')
  if (announced > limitBytes) return refuse('too-large')
  if (!request.body) return new Uint8Array()
  const reader = request.body.getReader()
  const parts: Uint8Array[] = []
  let size = 0
  for (;;) {
    const { done, value } = await reader.read()
    if (done) break
    size += value.byteLength
    if (size > limitBytes) {
      await reader.cancel()
      return refuse('too-large')
    }
    parts.push(value)
  }
  // A proxy in between may cut a body short without a word.
  if (announced > size) return refuse('malformed')
  return Buffer.concat(parts)
}
