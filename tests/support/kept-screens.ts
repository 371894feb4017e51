import { vi } from 'vitest'

/** A browser whose worker keeps the pages of these paths; for the test that runs now. jsdom has neither workers nor caches. */
export function keepScreens(paths: readonly string[]): void {
  vi.stubGlobal('caches', { match: (path: string) => Promise.resolve(paths.includes(path) ? new Response('') : undefined) })
  Object.defineProperty(navigator, 'serviceWorker', { configurable: true, value: { controller: {} } })
}

/** The browser as it was: nothing is kept. */
export function keepNothing(): void {
  vi.unstubAllGlobals()
  Reflect.deleteProperty(navigator, 'serviceWorker')
}
