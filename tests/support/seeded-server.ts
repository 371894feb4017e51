import { execFile } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { promisify } from 'node:util'
import { MARRAM } from '@/db/scenarios/marram'
import { type RunningServer, startServer } from './server-process'

const root = resolve(import.meta.dirname, '../..')

export interface SeededServer {
  readonly server: RunningServer
  /** Id of the demo event of today. */
  readonly event: string
  readonly password: string
  /** A folder that is gone after `end`. */
  readonly folder: string
  /** Ends the server given (it may have been restarted since) and removes the folder. */
  readonly end: (server: RunningServer) => Promise<void>
}

/** The built app over a database of its own, seeded as `npm run seed` does, in a process of its own. */
export async function startSeededServer(name: string): Promise<SeededServer> {
  const folder = mkdtempSync(join(tmpdir(), `lockwire-${name}-`))
  const db = join(folder, 'lockwire.db')
  const { stdout } = await promisify(execFile)(
    process.execPath,
    [join(root, 'node_modules/tsx/dist/cli.mjs'), '--conditions=react-server', 'db/seed.ts'],
    { cwd: root, env: { ...process.env, LOCKWIRE_DB: db } },
  )
  const { event } = JSON.parse(stdout) as { readonly event: string }
  return {
    server: await startServer({ db }),
    event,
    password: MARRAM.password,
    folder,
    end: async (server) => {
      await server.kill()
      rmSync(folder, { recursive: true, force: true })
    },
  }
}
