import { filesOfShell, isRuntime, shellFor, SHELLS } from './kept-shells'
import type { KeptFile, WorkerScope } from './worker-scope'

// Small and dull. It keeps the build's own files and the crew's shells, nothing else: nothing of /api, no page of a person, and
// no data that exists nowhere else. It changes places with its elder only when a person says so.

declare const self: WorkerScope & { readonly __WB_MANIFEST: readonly KeptFile[] }

const FILES = self.__WB_MANIFEST
const PREFIX = 'lockwire-'
const CACHE = `${PREFIX}${fingerprint(FILES)}`
const PATHS = new Set(FILES.map(({ url }) => pathOf(url)))

self.addEventListener('install', (event) => event.waitUntil(install()))
self.addEventListener('activate', (event) => event.waitUntil(activate()))
self.addEventListener('message', ({ data }) => {
  if (data === 'take-over') void self.skipWaiting()
})
self.addEventListener('fetch', (event) => {
  const { request } = event
  const url = new URL(request.url)
  if (request.method !== 'GET' || url.origin !== self.location.origin || url.pathname.startsWith('/api/')) return
  if (request.mode === 'navigate') event.respondWith(answerNavigation(request, url.pathname))
  else if (PATHS.has(url.pathname) || url.pathname.startsWith('/_next/static/')) event.respondWith(answerFile(request, url.pathname))
})

async function install(): Promise<void> {
  const cache = await self.caches.open(CACHE)
  try {
    await Promise.all(FILES.map(({ url }) => keepFile(cache, pathOf(url))))
    await Promise.all(SHELLS.map((shell) => keepShell(cache, shell)))
  } catch (error) {
    // Half a version is worse than the one before it.
    await self.caches.delete(CACHE)
    throw error
  }
}

/** The version before stays for one more: a tab that still runs it may yet ask for one of its files. */
async function activate(): Promise<void> {
  const ours = (await self.caches.keys()).filter((name) => name.startsWith(PREFIX) && name !== CACHE)
  await Promise.all(ours.slice(0, -1).map((name) => self.caches.delete(name)))
  await self.clients.claim()
}

async function keepFile(cache: Cache, path: string): Promise<void> {
  // What lies under _next/static has its content in its name, so an elder's copy is the same file.
  const elder = path.startsWith('/_next/static/') ? await self.caches.match(path, { ignoreVary: true }) : undefined
  await cache.put(path, elder ?? (await fetchWhole(path)))
}

async function keepShell(cache: Cache, shell: string): Promise<void> {
  const answer = await fetchWhole(shell)
  const files = filesOfShell(await answer.clone().text())
  // Of another build (the server was renewed this very moment): its runtime knows other files than ours, and would ask for them offline.
  if (!files.some((file) => isRuntime(file) && PATHS.has(file))) throw new Error(`${shell} is of another build than this worker.`)
  // A chunk that a shell shares with an online page is not on the list, and is needed all the same.
  await Promise.all(files.filter((file) => !PATHS.has(file)).map((file) => keepFile(cache, file)))
  await cache.put(shell, answer)
}

/** Without anybody's sign-in and past every cache. Throws unless the answer is the thing itself. */
async function fetchWhole(path: string): Promise<Response> {
  const answer = await fetch(path, { credentials: 'omit', cache: 'reload', redirect: 'error' })
  if (answer.status !== 200) throw new Error(`${path} answered ${answer.status}`)
  return answer
}

async function answerNavigation(request: Request, pathname: string): Promise<Response> {
  const shell = shellFor(pathname)
  if (shell !== null) return (await kept(shell)) ?? fetch(request)
  try {
    return await fetch(request)
  } catch (error) {
    const offline = await kept('/offline')
    if (offline === undefined) throw error
    return offline
  }
}

async function answerFile(request: Request, path: string): Promise<Response> {
  return (await kept(path)) ?? fetch(request)
}

/** Of this version first, else of the one before it. */
async function kept(path: string): Promise<Response | undefined> {
  const own = await (await self.caches.open(CACHE)).match(path, { ignoreVary: true })
  return own ?? self.caches.match(path, { ignoreVary: true })
}

/** The build writes `[` and `(` of file names escaped in one place and plain in another. */
function pathOf(url: string): string {
  return new URL(url, self.location.origin).pathname
}

/** One name for one list of files (FNV-1a); each build has an id among its file names, so two builds never share one. */
function fingerprint(files: readonly KeptFile[]): string {
  let hash = 0x811c9dc5
  for (const char of JSON.stringify(files)) hash = Math.imul(hash ^ (char.codePointAt(0) ?? 0), 0x01000193)
  return (hash >>> 0).toString(16).padStart(8, '0')
}
