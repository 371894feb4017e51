/**
 * Reads server-sent events from a body and calls `onEvent` at each that carries data; comments, which only keep the line open, are passed over. Resolves when
 * the stream ends. By hand because `EventSource` can send no header and so no device token.
 */
export async function readEventStream(body: ReadableStream<Uint8Array>, onEvent: (data: string) => void): Promise<void> {
  const reader = body.getReader()
  const decoder = new TextDecoder()
  let rest = ''
  for (;;) {
    const { done, value } = await reader.read()
    if (done) return
    const lines = (rest + decoder.decode(value, { stream: true })).split('\n')
    rest = lines.pop() ?? ''
    for (const line of lines) if (line.startsWith('data:')) onEvent(line.slice(5).trim())
  }
}
