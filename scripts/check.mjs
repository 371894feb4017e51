// `npm run check:fast`: format, lint, types, structure, unused code, unit and component tests; under three minutes on two cores.
// `npm run check`: the same, then the server tests, the build and the browser tests.
import { ensureBrowserTools } from './steps/browser-tools.mjs'
import { ensureBuilt } from './steps/build.mjs'
import { ensureInstalled } from './steps/install.mjs'
import { CHECKS, pool, runCheck, runTests } from './steps/lanes.mjs'
import { endAllOnSignals } from './steps/run.mjs'
import { main, Refusal, say, seconds } from './steps/say.mjs'
import { checkNode } from './steps/toolchain.mjs'

await main(async () => {
  const how = process.argv[2]
  if (how !== 'fast' && how !== 'full') throw new Refusal('Say which: node scripts/check.mjs fast, or node scripts/check.mjs full.')
  const began = performance.now()
  endAllOnSignals()
  checkNode()
  await ensureInstalled()
  say(`Running ${how === 'fast' ? 'the fast checks' : 'every check'}, two at a time.`)
  const results = await pool(2, fastWorks())
  if (how === 'full') results.push(...(await slowLanes()))
  const failed = results.reduce((sum, each) => sum + each.failed, 0)
  say(`${failed === 0 ? 'All good' : `${failed} failed`} after ${seconds(performance.now() - began)}.`)
  if (failed > 0) process.exitCode = 1
})

/** Longest first, so that two cores end together. */
function fastWorks() {
  const tests = ['unit', 'dom'].map((name) => () => runTests(name))
  const { lint, types, ...rest } = Object.fromEntries(Object.keys(CHECKS).map((name) => [name, () => runCheck(name)]))
  return [lint, types, ...tests, ...Object.values(rest)]
}

async function slowLanes() {
  const server = await runTests('server', { show: true })
  await ensureBuilt()
  const lacking = await ensureBrowserTools()
  if (lacking !== null) say(lacking)
  return [server, await runTests('e2e', { show: true })]
}
