import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs'
import { inRoot } from './root.mjs'
import { tool } from './run.mjs'
import { say, seconds } from './say.mjs'

/** Checks that give one verdict each: `[name, work]`. */
export const CHECKS = {
  format: () => tool('prettier/bin/prettier.cjs', ['--check', '--log-level', 'warn', '.'], quiet(120)),
  lint: () =>
    tool(
      'eslint/bin/eslint.js',
      ['--max-warnings', '0', '--cache', '--cache-location', '.test/eslint', '--cache-strategy', 'content', '.'],
      quiet(300),
    ),
  types: typecheck,
  structure: () =>
    tool('dependency-cruiser/bin/dependency-cruise.mjs', ['--config', '.dependency-cruiser.cjs', 'app', 'lib', 'db'], quiet(120)),
  unused: () => tool('knip/bin/knip.js', ['--no-progress'], quiet(120)),
}

/** Collected output is read later, perhaps in a file: no colours. */
const PLAIN = { NO_COLOR: '1', FORCE_COLOR: '0' }

/** Longest a lane of tests may take before it is stopped and counts as failed, in seconds. */
const LANE_LIMITS = { unit: 420, dom: 300, server: 420, e2e: 900 }

/** Runs one check and gives its counts: 1 passed or 1 failed. */
export async function runCheck(name) {
  const began = performance.now()
  mkdirSync(inRoot('.test'), { recursive: true })
  const { code, output } = await CHECKS[name]()
  return tell(
    name,
    { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1, why: [] },
    performance.now() - began,
    code === 0 ? '' : output,
  )
}

/** Runs one vitest project and counts from its JSON report. A lane that finds nothing to do counts as failed; so does a skipped test. */
export async function runTests(name, { show = false, env = {} } = {}) {
  const began = performance.now()
  const report = inRoot('.test', `${name}.json`)
  mkdirSync(inRoot('.test'), { recursive: true })
  rmSync(report, { force: true })
  const { code, output } = await tool(
    'vitest/vitest.mjs',
    ['run', '--project', name, '--reporter=dot', '--reporter=json', `--outputFile.json=${report}`],
    { show, env: { ...(show ? {} : PLAIN), ...env }, timeoutMs: LANE_LIMITS[name] * 1000 },
  )
  const counts = countReport(report, code)
  return tell(name, counts, performance.now() - began, counts.failed === 0 ? '' : output)
}

/** Reads a vitest JSON report into `{ passed, failed, why }`. */
export function countReport(file, code) {
  if (!existsSync(file)) return { passed: 0, failed: 1, why: ['it wrote no report'] }
  const report = JSON.parse(readFileSync(file, 'utf8'))
  const why = []
  const broken = report.testResults.filter(
    (each) => each.status === 'failed' && !each.assertionResults.some((test) => test.status === 'failed'),
  )
  if (broken.length > 0)
    why.push(`${broken.length} file(s) broke before or outside their tests: ${broken.map((each) => each.name).join(', ')}`)
  const skipped = report.numPendingTests + report.numTodoTests
  if (skipped > 0) why.push(`${skipped} skipped or to do, which counts as failed`)
  let failed = report.numFailedTests + broken.length + skipped
  if (report.numTotalTests === 0 && failed === 0) {
    failed = 1
    why.push('it found nothing to do')
  }
  if (code !== 0 && failed === 0) {
    failed = 1
    why.push(code === 124 ? 'it took too long' : `it ended with code ${code} although no test failed: an error outside the tests`)
  }
  return { passed: report.numPassedTests, failed, why }
}

/** Says a lane's counts, with its output when something failed. */
function tell(name, counts, ms, output) {
  if (output !== '') process.stdout.write(`\n── ${name} ──\n${output.trimEnd()}\n`)
  const because = counts.why.length > 0 ? ` (${counts.why.join('; ')})` : ''
  say(`${counts.failed === 0 ? '✓' : '✗'} ${name}: passed ${counts.passed}, failed ${counts.failed}, ${seconds(ms)}${because}`)
  return counts
}

/** Runs works at most `width` at a time, in order, and gives their results in that order. */
export async function pool(width, works) {
  const results = []
  let next = 0
  await Promise.all(
    Array.from({ length: width }, async () => {
      while (next < works.length) {
        const mine = next++
        results[mine] = await works[mine]()
      }
    }),
  )
  return results
}

async function typecheck() {
  // Next's own type files are made by a build; a fresh clone has none yet.
  const typegen = await tool('next/dist/bin/next', ['typegen'], quiet(120))
  if (typegen.code !== 0) return typegen
  return tool('typescript/bin/tsc', ['--noEmit', '-p', '.'], quiet(300))
}

function quiet(limitSeconds) {
  return { show: false, env: PLAIN, timeoutMs: limitSeconds * 1000 }
}
