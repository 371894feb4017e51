// `npm run demo`: from a fresh clone to a served demo event, saying what it does. A second run starts at once.
// `PORT` moves it; `npm run demo -- --fresh` sets today's data aside and seeds anew; `npm run demo -- --lan` serves phones on the local network by https.
import { spawnSync } from 'node:child_process'
import { closeSync, existsSync, mkdirSync, openSync, readFileSync } from 'node:fs'
import { createServer } from 'node:net'
import { ensureBuilt } from './steps/build.mjs'
import { ensureSeeded } from './steps/demo-data.mjs'
import { ensureInstalled } from './steps/install.mjs'
import { lanAddress } from './steps/lan-address.mjs'
import { startCertificatePage, startLanProxy } from './steps/lan-proxy.mjs'
import { localCertificate } from './steps/local-authority.mjs'
import { inRoot, root } from './steps/root.mjs'
import { endAll, endAllOnSignals, start } from './steps/run.mjs'
import { main, Refusal, say, seconds, step } from './steps/say.mjs'
import { checkNode } from './steps/toolchain.mjs'
import { watchParent } from './steps/watch-parent.mjs'

const LOG = '.demo/server.log'
const began = performance.now()

await main(async () => {
  const end = endAllOnSignals(() => say('\nStopping the demo. Its data stays in .demo/data for the next run.'))
  watchParent(() => end('SIGTERM'))
  const port = readPort(process.env.PORT)
  checkNode()
  const lan = process.argv.includes('--lan') ? { address: lanAddress(), inner: port + 1, page: port + 2 } : null
  await refuseTakenPort(port)
  if (lan) for (const other of [lan.inner, lan.page]) await refuseTakenPort(other)
  mkdirSync(inRoot('.demo'), { recursive: true })
  await ensureInstalled()
  await ensureBuilt()
  const origin = lan ? `https://${lan.address}:${port}` : `http://localhost:${port}`
  const demo = await ensureSeeded({ origin, fresh: process.argv.includes('--fresh') })
  const server = await step(`Starting the server on port ${port}`, () => serve(lan ? lan.inner : port, origin, demo.database, lan !== null))
  if (lan) await openToPhones(lan, port, origin)
  sayWhereToGo(origin, demo.said)
  if (lan) await sayHowToTrust(lan)
  await new Promise((done) => server.on('exit', done))
  await endAll()
  throw new Refusal(`The server ended by itself. The end of its log (${LOG}):\n${logTail()}`)
})

function readPort(text) {
  if (text === undefined || text === '') return 3000
  const port = Number(text)
  if (Number.isInteger(port) && port >= 1 && port <= 65535) return port
  throw new Refusal(`PORT must be a whole number from 1 to 65535; it is “${text}”. Nothing was started.`)
}

/** Before anything slow: finding out after the build would waste two minutes. */
async function refuseTakenPort(port) {
  const fault = await new Promise((done) => {
    const probe = createServer()
    probe.once('error', (error) => done(error.code))
    probe.listen(port, () => probe.close(() => done(null)))
  })
  if (fault === null) return
  if (fault === 'EACCES')
    throw new Refusal(`This account may not serve on port ${port}. Nothing was started. Use another: PORT=3001 npm run demo`)
  throw new Refusal(
    `Port ${port} is taken by another program (perhaps a demo that still runs). Nothing was started. Use another: PORT=${port + 1} npm run demo`,
  )
}

/** https for the phones, and beside it, without https, the page on which they get the certificate that makes them trust it. */
async function openToPhones({ address, inner, page }, port, origin) {
  const { key, cert, authority } = localCertificate(inRoot('.demo/lan'), address)
  await startLanProxy({ port, address, inner, key, cert })
  await startCertificatePage({ port: page, address, origin, authority })
}

async function sayHowToTrust({ address, page }) {
  const link = `http://${address}:${page}`
  const { toString } = (await import('qrcode')).default
  say(`\nOn each phone once: open ${link} and install the demo's certificate (README, “On real phones”).\n`)
  say(await toString(link, { type: 'terminal', small: true }))
}

async function serve(port, origin, database, isBehindProxy) {
  const log = openSync(inRoot(LOG), 'w')
  const only = isBehindProxy ? ['-H', '127.0.0.1'] : []
  const server = start(process.execPath, [`${root}/node_modules/next/dist/bin/next`, 'start', '-p', String(port), ...only], {
    env: { PORT: String(port), LOCKWIRE_DB: database, LOCKWIRE_ORIGIN: origin, NODE_ENV: 'production' },
    stdio: ['ignore', log, log],
  })
  closeSync(log)
  let ended = false
  server.once('exit', () => (ended = true))
  for (let tries = 0; tries < 600 && !ended; tries++) {
    const status = await fetch(`http://127.0.0.1:${port}/`, { redirect: 'manual', headers: { host: `localhost:${port}` } }).then(
      (answer) => answer.status,
      () => 0,
    )
    if (status >= 500) break
    if (status > 0) return server
    await new Promise((next) => setTimeout(next, 100))
  }
  await endAll()
  throw new Refusal(`The server did not come up. The end of its log (${LOG}):\n${logTail()}`)
}

function logTail() {
  return existsSync(inRoot(LOG)) ? readFileSync(inRoot(LOG), 'utf8').split('\n').slice(-25).join('\n') : '(empty)'
}

function sayWhereToGo(origin, said) {
  const signIns = said.signIns ?? []
  const links = said.links ?? []
  const wide = Math.max(...signIns.map((each) => each.role.length), ...links.map((each) => each.what.length), 'Pit exit'.length)
  say(`\nLockwire runs at ${origin}  (ready after ${seconds(performance.now() - began)}, commit ${commit()})\n`)
  for (const { role, email, password } of signIns) say(`  ${role.padEnd(wide)}  ${email}  /  ${password}`)
  say('')
  for (const { what, path } of links) say(`  ${what.padEnd(wide)}  ${origin}${path}`)
  for (const line of said.notes ?? []) say(`  ${line}`)
  say(`\nWhat the server logs: ${LOG}. Data: .demo/data. Ctrl-C ends it.`)
}

function commit() {
  const answer = spawnSync('git', ['rev-parse', '--short', 'HEAD'], { cwd: root, encoding: 'utf8' })
  return answer.status === 0 ? answer.stdout.trim() : 'unknown'
}
