import { execFileSync } from 'node:child_process'
import { existsSync, readFileSync } from 'node:fs'
import { inRoot, root } from './root.mjs'
import { childEnv, run } from './run.mjs'
import { Refusal, say, step } from './say.mjs'
import { missingCompilers, ownNodeHeaders } from './toolchain.mjs'

/** Installs exactly what the lock file says when something of it is missing or another version; compiles SQLite's binding where it does not load. */
export async function ensureInstalled() {
  if (!isInstalled())
    await step('Installing the packages that package-lock.json names (SQLite is compiled on the way: a minute or two)', install)
  if (!(await sqliteLoads())) await step('Compiling SQLite for this Node (about a minute)', rebuildSqlite)
}

function isInstalled() {
  const there = inRoot('node_modules/.package-lock.json')
  if (!existsSync(there)) return false
  const wanted = JSON.parse(readFileSync(inRoot('package-lock.json'), 'utf8')).packages
  const have = JSON.parse(readFileSync(there, 'utf8')).packages
  // Optional packages are another platform's; npm leaves those out.
  return Object.entries(wanted).every(
    ([path, wants]) => path === '' || wants.optional || wants.devOptional || have[path]?.version === wants.version,
  )
}

async function install() {
  const lacking = missingCompilers()
  if (lacking.length > 0) say(`  Note: ${lacking.join(' and ')} not found. It works only if a ready-made SQLite binding can be downloaded.`)
  const { code } = await npm(['ci', '--include=dev'])
  if (code === 0) return
  throw new Refusal(
    lacking.length > 0
      ? `The install failed, most likely because SQLite's binding must be compiled here and ${lacking.join(' and ')} is missing. On Debian: apt-get install g++ make python3. Then run the same command again.`
      : 'The install failed; what npm said is above. Nothing was started. Run the same command again once that is mended.',
  )
}

async function rebuildSqlite() {
  const { code } = await npm(['rebuild', 'better-sqlite3'])
  if (code !== 0 || !(await sqliteLoads())) {
    throw new Refusal(
      "SQLite's binding could not be compiled; it needs g++, make and python3. On Debian: apt-get install g++ make python3.",
    )
  }
}

async function sqliteLoads() {
  const { code } = await run(process.execPath, ['-e', "new (require('better-sqlite3'))(':memory:').close()"], { show: false })
  return code === 0
}

function npm(args) {
  const headers = npmConfig('nodedir') === null ? ownNodeHeaders() : null
  const env = headers === null ? {} : { npm_config_nodedir: headers }
  const [command, ...first] = npmCommand()
  return run(command, [...first, ...args], { env })
}

/** The npm that runs us, where one does. */
function npmCommand() {
  const script = process.env.npm_execpath
  return script?.endsWith('npm-cli.js') ? [process.execPath, script] : ['npm']
}

function npmConfig(name) {
  const [command, ...first] = npmCommand()
  const answer = execFileSync(command, [...first, 'config', 'get', name], { cwd: root, env: childEnv(), encoding: 'utf8' }).trim()
  return answer === '' || answer === 'undefined' || answer === 'null' ? null : answer
}
