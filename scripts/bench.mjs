// `npm run bench`: measures in one run, side by side, and prints one table. Ratios mean something on any machine; the bare figures only on this one.
// `npm run bench -- fold push` runs only the named ones.
import { readdirSync } from 'node:fs'
import { cpus } from 'node:os'
import { ensureBrowserTools } from './steps/browser-tools.mjs'
import { ensureBuilt } from './steps/build.mjs'
import { ensureInstalled } from './steps/install.mjs'
import { inRoot } from './steps/root.mjs'
import { endAllOnSignals, tool } from './steps/run.mjs'
import { main, Refusal, say, step } from './steps/say.mjs'
import { checkNode } from './steps/toolchain.mjs'

/** Those that measure the built app. */
const NEED_BUILD = new Set(['push', 'bytes'])
const ENDING = '.bench.ts'

await main(async () => {
  endAllOnSignals()
  checkNode()
  await ensureInstalled()
  const names = chosen(process.argv.slice(2))
  if (names.some((name) => NEED_BUILD.has(name))) await ensureBuilt()
  if (names.includes('bytes')) {
    const lacking = await ensureBrowserTools()
    if (lacking !== null) throw new Refusal(lacking)
  }
  const rows = []
  for (const name of names) rows.push(...(await step(`Measuring ${name}`, () => measure(name))))
  say('')
  for (const line of table(rows)) say(line)
  say(`\nMeasured on ${cpus().length} × ${cpus()[0]?.model.trim() ?? 'unknown processor'}, Node ${process.version}.`)
  if (rows.some((row) => row.met === false)) say('An aim that is not met is marked “no”: it is a finding, not a failed test.')
})

function chosen(asked) {
  const there = readdirSync(inRoot('tests/bench'))
    .filter((file) => file.endsWith(ENDING))
    .map((file) => file.slice(0, -ENDING.length))
    .sort()
  const unknown = asked.filter((name) => !there.includes(name))
  if (unknown.length > 0) throw new Refusal(`There is no bench called ${unknown.join(', ')}. There are: ${there.join(', ')}.`)
  return asked.length > 0 ? asked : there
}

/** A bench prints one JSON line a row: `{ what, value, aim?, met? }`. */
async function measure(name) {
  const { code, output } = await tool('tsx/dist/cli.mjs', ['--conditions=react-server', inRoot(`tests/bench/${name}${ENDING}`)], {
    show: false,
    timeoutMs: 300_000,
  })
  const rows = output
    .split('\n')
    .filter((line) => line.startsWith('{"what"'))
    .map((line) => JSON.parse(line))
  if (code !== 0 || rows.length === 0) throw new Refusal(`The bench ${name} did not come to an end. It said:\n${output}`)
  return rows
}

function table(rows) {
  const cells = [['what', 'measured', 'aim', 'met'], ...rows.map(({ what, value, aim = '', met }) => [what, value, aim, met === undefined ? '' : met ? 'yes' : 'no'])]
  const widths = [0, 1, 2, 3].map((column) => Math.max(...cells.map((row) => row[column].length)))
  const lines = cells.map((row) => row.map((cell, column) => (column === 1 ? cell.padStart(widths[column]) : cell.padEnd(widths[column]))).join('  ').trimEnd())
  return [lines[0], widths.map((width) => '─'.repeat(width)).join('  '), ...lines.slice(1)]
} // prettier-ignore
