import { createHash } from 'node:crypto'
import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import nextPwa from 'next-pwa'

/** Files of `public/` that the crew's screens need with the network off. next-pwa lists none by itself once it is given a list. */
const KEPT = ['/theme.js', '/icons/icon.svg', '/icons/icon-192.png', '/icons/icon-512.png', '/wasm/zxing_reader.wasm']

/** Chunks of pages that never answer offline: keeping them would cost a crew phone bytes for nothing. */
const ONLINE_ONLY = /static\/chunks\/app\/(\(|%28)(organiser|entrant|public)|static\/chunks\/app\/(design|p|P|api)\//

/** What only the older router and browsers without modules load; ours have neither. */
const OLD_ROUTER = /static\/chunks\/(main|framework|polyfills)-/

/**
 * Wraps the build so that next-pwa compiles `app/_worker/worker.ts` into `public/sw.js` with the list of what it keeps.
 * next-pwa's own worker is not used: its defaults answered a signed-out person with another's page. Only in the production build, webpack only.
 */
export function withWorker(config) {
  return nextPwa({
    dest: 'public',
    swSrc: 'app/_worker/worker.ts',
    // None of its conveniences: we register ourselves, and a new worker waits until a person says so.
    register: false,
    skipWaiting: false,
    clientsClaim: false,
    cacheStartUrl: false,
    dynamicStartUrl: false,
    reloadOnOnline: false,
    fallbacks: false,
    additionalManifestEntries: KEPT.map((url) => ({ url, revision: revision(url) })),
    buildExcludes: [/app-build-manifest\.json$/, /dynamic-css-manifest\.json$/, /\.map$/, /sw\.js$/, OLD_ROUTER, ONLINE_ONLY],
    maximumFileSizeToCacheInBytes: 5_000_000,
  })(config)
}

function revision(url) {
  const file = join('public', url)
  if (!existsSync(file)) throw new Error(`The worker should keep ${url}, but public${url} is not there.`)
  return createHash('sha256').update(readFileSync(file)).digest('hex').slice(0, 16)
}
