import { type ChildProcess, spawn } from 'node:child_process'
import { existsSync } from 'node:fs'
import { createServer } from 'node:net'
import { join, resolve } from 'node:path'

const root = resolve(import.meta.dirname, '../..')

export interface ServerOptions {
  /** The database file; it outlives the server. */
  readonly db: string
  /** Left out: a free one. */
  readonly port?: number
  /** Folder of another built app; left out: ours. */
  readonly app?: string
  readonly env?: Readonly<Record<string, string>>
}

export interface RunningServer {
  readonly origin: string
  readonly port: number
  readonly db: string
  readonly pid: number
  /** Everything it has printed so far. */
  readonly log: () => string
  /** Pulls the plug: SIGKILL to the whole process group, resolved once nothing of it is left. */
  readonly kill: () => Promise<void>
  /** Ends it as an operator would (SIGTERM). */
  readonly stop: () => Promise<void>
  /** The same server again on the same database and port; call after `kill` or `stop`. */
  readonly restart: () => Promise<RunningServer>
}

/** Starts the built app (`next start`) as a process of its own and waits until it answers. Throws with its log when it does not. */
export async function startServer(options: ServerOptions): Promise<RunningServer> {
  const app = options.app ?? root
  if (!existsSync(join(app, '.next/BUILD_ID'))) throw new Error('There is no build to start. Run `npm run build` first (`npm test` does).')
  const port = options.port ?? (await freePort())
  const origin = `http://localhost:${port}`
  const child = spawn(process.execPath, [join(root, 'node_modules/next/dist/bin/next'), 'start', '-p', String(port)], {
    cwd: app,
    detached: true,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { ...process.env, NODE_ENV: 'production', PORT: String(port), LOCKWIRE_DB: options.db, LOCKWIRE_ORIGIN: origin, ...options.env },
  })
  let log = ''
  child.stdout.on('data', (chunk: Buffer) => (log += chunk.toString()))
  child.stderr.on('data', (chunk: Buffer) => (log += chunk.toString()))
  // A test that fails half-way must not leave its server behind.
  const atExit = () => signalGroup(child, 'SIGKILL')
  process.once('exit', atExit)
  const end = async (signal: NodeJS.Signals) => {
    await endGroup(child, signal)
    process.removeListener('exit', atExit)
  }
  try {
    await untilItAnswers(child, origin)
  } catch (error) {
    await end('SIGKILL')
    throw new Error(`${String(error)}\nIts log:\n${log}`, { cause: error })
  }
  return {
    origin,
    port,
    db: options.db,
    pid: child.pid ?? 0,
    log: () => log,
    kill: () => end('SIGKILL'),
    stop: () => end('SIGTERM'),
    restart: () => startServer({ ...options, port }),
  }
}

/** A port nothing listens on right now. */
export function freePort(): Promise<number> {
  return new Promise((done, fail) => {
    const probe = createServer()
    probe.once('error', fail)
    probe.listen(0, () => {
      const address = probe.address()
      const port = typeof address === 'object' && address !== null ? address.port : 0
      probe.close(() => done(port))
    })
  })
}

async function untilItAnswers(child: ChildProcess, origin: string): Promise<void> {
  const deadline = performance.now() + 60_000
  while (performance.now() < deadline) {
    if (child.exitCode !== null || child.signalCode !== null)
      throw new Error(`The server ended before it answered (${child.exitCode ?? child.signalCode ?? ''}).`)
    const status = await fetch(origin, { redirect: 'manual' }).then(
      (answer) => answer.status,
      () => 0,
    )
    if (status >= 500) throw new Error(`The server answers ${origin} with ${status}.`)
    if (status > 0) return
    await new Promise((next) => setTimeout(next, 50))
  }
  throw new Error('The server did not answer within 60 s.')
}

async function endGroup(child: ChildProcess, signal: NodeJS.Signals): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return
  const gone = new Promise<void>((done) => child.once('exit', () => done()))
  signalGroup(child, signal)
  const insist = setTimeout(() => signalGroup(child, 'SIGKILL'), 5000)
  await gone
  clearTimeout(insist)
}

function signalGroup(child: ChildProcess, signal: NodeJS.Signals): void {
  if (child.pid === undefined) return
  try {
    process.kill(-child.pid, signal)
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'ESRCH')) throw error
  }
}
