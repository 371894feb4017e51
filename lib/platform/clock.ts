const system = () => Date.now()
let source: () => number = system

/** Milliseconds since the epoch, UTC. The only clock that commands and queries read. */
export function now(): number {
  return source()
}

/** Puts another clock in its place until the returned function is called; for tests. */
export function setClock(clock: () => number): () => void {
  source = clock
  return () => {
    source = system
  }
}
