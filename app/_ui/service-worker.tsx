'use client'

import { useEffect } from 'react'
import { Button } from './button'
import { useNewVersion, watchForNewVersion } from './new-version'

/** Keeps the app openable offline, and says when a newer version waits. It stands below the page's content, so that nothing moves under a finger. */
export function ServiceWorker() {
  const { isWaiting, take } = useNewVersion()
  useEffect(() => {
    if (process.env.NODE_ENV !== 'production' || !('serviceWorker' in navigator)) return
    let isOver = false
    let end: (() => void) | null = null
    watchForNewVersion(navigator.serviceWorker).then(
      (stop) => {
        if (isOver) stop()
        else end = stop
      },
      // A browser that refuses (private window, no TLS): the pages work, with the network only; the device check says so.
      (error: unknown) => console.info('This browser keeps nothing for offline use.', error), // eslint-disable-line no-console -- harmless, and nobody else would know
    )
    return () => {
      isOver = true
      end?.()
    }
  }, [])

  if (!isWaiting) return null
  return (
    <aside data-slot="new-version" aria-label="New version" className="flex flex-wrap items-center gap-4 border-t bg-surface p-4">
      <p className="grow">A newer version is ready. Finish what you are doing first; what you recorded stays.</p>
      <Button onClick={take}>Use it now</Button>
    </aside>
  )
}
