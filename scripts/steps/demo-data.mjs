import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { inRoot } from './root.mjs'
import { run } from './run.mjs'
import { Refusal, say, step } from './say.mjs'
import { seedHash } from './source-hash.mjs'

const DATA = '.demo/data'

/**
 * The demo's database, seeded when there is none, when the seed has changed, or when its event is over.
 * Older data is set aside, never deleted. Gives the file and what the seed said: sign-ins and links.
 */
export async function ensureSeeded({ origin, fresh }) {
  const hash = seedHash()
  const found = readMark()
  const why = fresh ? 'as asked' : found && staleBecause(found, hash)
  if (found && !why) return { database: inRoot(DATA, 'lockwire.db'), said: found.said }
  if (existsSync(inRoot(DATA))) setAside(why ?? 'it was not finished')
  return step('Filling the demo event with people, cars and a checklist', () => seed(origin, hash))
}

function readMark() {
  const file = inRoot(DATA, 'seeded.json')
  return existsSync(file) && existsSync(inRoot(DATA, 'lockwire.db')) ? JSON.parse(readFileSync(file, 'utf8')) : null
}

function staleBecause(mark, hash) {
  if (mark.hash !== hash) return 'the demo has changed since'
  // By the venue's own day it may still be running for some hours; a day of grace is enough for any time zone.
  const yesterday = new Date(Date.now() - 86_400_000).toISOString().slice(0, 10)
  return mark.said.lastDay !== undefined && mark.said.lastDay < yesterday ? 'its event is over' : null
}

function setAside(why) {
  const kept = `${DATA}-${new Date().toISOString().replace(/[:.]/g, '-')}`
  renameSync(inRoot(DATA), inRoot(kept))
  say(`  The data of the last run was set aside (${why}); it is kept in ${kept}.`)
}

/** Into a folder of its own first, so that a seed cut short is never taken for a whole one. */
async function seed(origin, hash) {
  const making = inRoot('.demo/data-making')
  rmSync(making, { recursive: true, force: true })
  mkdirSync(making, { recursive: true })
  const answer = await run(process.execPath, [inRoot('node_modules/tsx/dist/cli.mjs'), '--conditions=react-server', inRoot('db/seed.ts')], {
    show: false,
    env: { LOCKWIRE_DB: `${making}/lockwire.db`, LOCKWIRE_ORIGIN: origin, LOCKWIRE_LOG: 'error' },
  })
  if (answer.code !== 0) throw new Refusal(`The demo event could not be made. What the seed said:\n${answer.output}`)
  const said = lastJson(answer.output)
  writeFileSync(`${making}/seeded.json`, JSON.stringify({ hash, said }))
  renameSync(making, inRoot(DATA))
  return { database: inRoot(DATA, 'lockwire.db'), said }
}

function lastJson(output) {
  const from = output.indexOf('{')
  try {
    return JSON.parse(output.slice(from))
  } catch {
    throw new Refusal(`The seed ran but did not end with its sign-ins as JSON. It said:\n${output}`)
  }
}
