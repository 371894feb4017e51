'use client'

import { useSyncExternalStore } from 'react'

let waiting: ServiceWorker | null = null
let asked = false
const listeners = new Set<() => void>()

/** Whether a newer version of the app waits, and how a person takes it. Nothing changes on the page until then. */
export function useNewVersion(): { readonly isWaiting: boolean; readonly take: () => void } {
  const isWaiting = useSyncExternalStore(
    subscribe,
    () => waiting !== null,
    () => false,
  )
  return { isWaiting, take }
}

/** Registers the worker, looks for a newer one each hour and whenever the page comes back into view. Gives back what ends the looking. */
export async function watchForNewVersion(container: ServiceWorkerContainer): Promise<() => void> {
  const registration = await container.register('/sw.js', { updateViaCache: 'none' })
  const look = () => {
    // Offline is a state, not an error: it will look again.
    if (document.visibilityState === 'visible') registration.update().catch(() => undefined)
  }
  const reload = () => {
    if (asked) location.reload()
  }
  setWaiting(container.controller ? registration.waiting : null)
  registration.addEventListener('updatefound', () => followInstall(registration, container))
  container.addEventListener('controllerchange', reload)
  document.addEventListener('visibilitychange', look)
  const hourly = setInterval(look, 3_600_000)
  return () => {
    clearInterval(hourly)
    document.removeEventListener('visibilitychange', look)
    container.removeEventListener('controllerchange', reload)
  }
}

/** Whether this device can open the page at `path` (`/bay`, `/pit-exit`) with the network off. */
export async function isKeptOffline(path: string): Promise<boolean> {
  if (!('serviceWorker' in navigator) || navigator.serviceWorker.controller === null) return false
  return (await caches.match(path, { ignoreVary: true })) !== undefined
}

function followInstall(registration: ServiceWorkerRegistration, container: ServiceWorkerContainer): void {
  const incoming = registration.installing
  incoming?.addEventListener('statechange', () => {
    // The very first worker replaces nothing, so there is nothing to ask.
    if (incoming.state === 'installed' && container.controller !== null) setWaiting(incoming)
    if (incoming.state === 'redundant' && waiting === incoming) setWaiting(null)
  })
}

function take(): void {
  asked = true
  waiting?.postMessage('take-over')
}

function setWaiting(worker: ServiceWorker | null): void {
  waiting = worker
  for (const listener of listeners) listener()
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener)
  return () => listeners.delete(listener)
}
