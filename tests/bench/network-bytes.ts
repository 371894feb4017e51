import type { Page } from 'playwright-core'

/** Bytes that came over the wire, compressed as the server sent them, by what they were. */
export interface NetworkBytes {
  readonly total: number
  /** The decoder's WebAssembly; not part of `rest`. */
  readonly wasm: number
  readonly rest: number
  readonly byKind: Readonly<Record<string, number>>
}

/** Counts everything a page loads from now on, as Chromium's own network layer reports it. Call what it gives to read the sums. */
export async function countNetworkBytes(page: Page): Promise<() => NetworkBytes> {
  const session = await page.context().newCDPSession(page)
  const kinds = new Map<string, string>()
  const sums = new Map<string, number>()
  await session.send('Network.enable')
  session.on('Network.responseReceived', ({ requestId, response, type }) => {
    kinds.set(requestId, response.url.endsWith('.wasm') ? 'wasm' : type.toLowerCase())
  })
  session.on('Network.loadingFinished', ({ requestId, encodedDataLength }) => {
    const kind = kinds.get(requestId) ?? 'other'
    sums.set(kind, (sums.get(kind) ?? 0) + encodedDataLength)
  })
  return () => {
    const byKind = Object.fromEntries(sums)
    const total = [...sums.values()].reduce((sum, bytes) => sum + bytes, 0)
    const wasm = sums.get('wasm') ?? 0
    return { total, wasm, rest: total - wasm, byKind }
  }
}
