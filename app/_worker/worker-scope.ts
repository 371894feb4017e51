/** A file the build lists for the worker. */
export interface KeptFile {
  readonly url: string
  readonly revision: string | null
}

interface LifeEvent {
  readonly waitUntil: (work: Promise<unknown>) => void
}

interface FetchEvent extends LifeEvent {
  readonly request: Request
  readonly respondWith: (answer: Promise<Response>) => void
}

interface MessageEvent {
  readonly data: unknown
}

/** What we use of a service worker's global scope. TypeScript's own worker types clash with the page's, which the rest of the project needs. */
export interface WorkerScope {
  readonly location: Location
  readonly caches: CacheStorage
  readonly clients: { readonly claim: () => Promise<void> }
  readonly skipWaiting: () => Promise<void>
  addEventListener(type: 'install' | 'activate', listener: (event: LifeEvent) => void): void
  addEventListener(type: 'fetch', listener: (event: FetchEvent) => void): void
  addEventListener(type: 'message', listener: (event: MessageEvent) => void): void
}
