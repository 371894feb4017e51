// `npm test`: installs what is missing, builds, runs everything. Its last line is always `N passed, N failed`.
import { ensureBrowserTools } from './steps/browser-tools.mjs'
import { ensureBuilt } from './steps/build.mjs'
import { ensureInstalled } from './steps/install.mjs'
import { CHECKS, pool, runCheck, runTests } from './steps/lanes.mjs'
import { endAllOnSignals } from './steps/run.mjs'
import { say, seconds } from './steps/say.mjs'
import { checkNode } from './steps/toolchain.mjs'

const began = performance.now()
const results = []
let concluded = false
endAllOnSignals(() => {
  results.push({ passed: 0, failed: 1 })
  conclude()
})

try {
  checkNode()
  await ensureInstalled()
  await everything()
} catch (error) {
  process.stderr.write(`\n${error.message}\n`)
  results.push({ passed: 0, failed: 1 })
}
conclude()

async function everything() {
  const lacking = await ensureBrowserTools()
  if (lacking !== null) say(lacking)
  const checks = Object.keys(CHECKS).map((name) => () => keep(runCheck(name)))
  await pool(2, [...checks, () => keep(runTests('unit')), () => keep(runTests('dom'))])
  await keep(runTests('server', { show: true }))
  if (!(await built())) results.push({ passed: 0, failed: 1 })
  // Also without a build or a browser: each of its tests then fails and says why, none is left out.
  await keep(runTests('e2e', { show: true }))
}

async function built() {
  try {
    await ensureBuilt()
    return true
  } catch (error) {
    process.stderr.write(`\n${error.message}\n`)
    return false
  }
}

async function keep(work) {
  results.push(await work)
}

function conclude() {
  if (concluded) return
  concluded = true
  const sum = (field) => results.reduce((total, each) => total + each[field], 0)
  say(`Everything took ${seconds(performance.now() - began)}.`)
  say(`${sum('passed')} passed, ${sum('failed')} failed`)
  process.exitCode = sum('failed') === 0 && sum('passed') > 0 ? 0 : 1
}
