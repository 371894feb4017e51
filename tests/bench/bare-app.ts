import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join, resolve } from 'node:path'

const root = resolve(import.meta.dirname, '../..')
export const BARE_APP = join(root, '.test/bare-route')

/**
 * What a push costs at the least: read the body, verify every signature (all at once, the fastest way Node has), insert the same rows into the same
 * table in one transaction. No roles, no rules, no fold.
 */
const ROUTE = `
import { createHash, createPublicKey, verify } from 'node:crypto'
import Database from 'better-sqlite3'

// Opened by the first request: the build imports this file too.
let opened = null
function open() {
  const database = new Database(process.env.LOCKWIRE_DB)
  for (const pragma of ['journal_mode = WAL', 'synchronous = FULL', 'foreign_keys = ON', 'busy_timeout = 5000', 'recursive_triggers = ON']) database.pragma(pragma)
  const last = database.prepare('SELECT seq, chain FROM record WHERE event_id = ? ORDER BY seq DESC LIMIT 1')
  const insert = database.prepare(
    'INSERT INTO record (event_id, seq, club_id, id, jws, hash, chain, disposition, code, kind, subject_key, device_id, device_seq, received_at) VALUES (?, ?, ?, ?, ?, ?, ?, ?, NULL, ?, ?, ?, ?, ?)',
  )
  const store = database.transaction((event, records) => {
    let { seq, chain } = last.get(event) ?? { seq: 0, chain: '' }
    for (const { jws, payload } of records) {
      seq += 1
      const hash = createHash('sha256').update(jws).digest('hex')
      chain = createHash('sha256').update(chain + '\\n' + jws + '\\naccepted').digest('hex')
      insert.run(event, seq, process.env.BARE_CLUB, payload.id, jws, hash, chain, 'accepted', payload.kind, 'car:' + payload.subject.car, payload.device, payload.deviceSeq, Date.now())
    }
  })
  return { store, key: createPublicKey({ key: { kty: 'OKP', crv: 'Ed25519', x: process.env.BARE_KEY }, format: 'jwk' }) }
}

function verified(jws, key) {
  const end = jws.lastIndexOf('.')
  return new Promise((done, fail) =>
    verify(null, Buffer.from(jws.slice(0, end)), key, Buffer.from(jws.slice(end + 1), 'base64url'), (error, ok) => (error ? fail(error) : done(ok))),
  )
}

export async function POST(request) {
  const { event, records } = await request.json()
  opened ??= open()
  const results = await Promise.all(records.map((jws) => verified(jws, opened.key)))
  if (results.includes(false)) return Response.json({ error: 'signature' }, { status: 400 })
  opened.store(event, records.map((jws) => ({ jws, payload: JSON.parse(Buffer.from(jws.split('.')[1], 'base64url').toString()) })))
  return Response.json({ stored: records.length })
}
`

const FILES: Readonly<Record<string, string>> = {
  'app/api/push/route.js': ROUTE,
  'app/layout.js': "export default function Layout({ children }) {\n  return <html lang='en'><body>{children}</body></html>\n}\n",
  'app/page.js': 'export default function Page() {\n  return null\n}\n',
  'next.config.mjs': "export default { serverExternalPackages: ['better-sqlite3'], outputFileTracingRoot: import.meta.dirname }\n",
  'package.json': '{ "name": "bare-route", "private": true }\n',
}

/** Writes and builds a Next app with that one route, unless it is already built from these very files. */
export function buildBareApp(): void {
  const mark = createHash('sha256').update(JSON.stringify(FILES)).digest('hex')
  const markFile = join(BARE_APP, '.next/mark')
  if (existsSync(markFile) && readFileSync(markFile, 'utf8') === mark) return
  rmSync(BARE_APP, { recursive: true, force: true })
  for (const [name, text] of Object.entries(FILES)) {
    mkdirSync(join(BARE_APP, name, '..'), { recursive: true })
    writeFileSync(join(BARE_APP, name), text)
  }
  const { NODE_ENV: _dropped, ...env } = process.env
  // Without NODE_ENV, which the build sets for itself; Next's types want one.
  const built = spawnSync(process.execPath, [join(root, 'node_modules/next/dist/bin/next'), 'build', '--webpack'], {
    cwd: BARE_APP,
    env: { ...env, NEXT_TELEMETRY_DISABLED: '1' } as unknown as NodeJS.ProcessEnv,
    encoding: 'utf8',
  })
  if (built.status !== 0) throw new Error(`the bare app does not build:\n${built.stdout}${built.stderr}`)
  writeFileSync(markFile, mark)
}
