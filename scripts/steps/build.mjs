import { copyFileSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { inRoot } from './root.mjs'
import { tool } from './run.mjs'
import { Refusal, step } from './say.mjs'
import { buildHash } from './source-hash.mjs'

const MARK = '.next/lockwire-build.json'

/** Whether `.next` holds a finished build of exactly these sources. */
export function isBuildCurrent(hash = buildHash()) {
  if (!existsSync(inRoot(MARK)) || !existsSync(inRoot('.next/BUILD_ID'))) return false
  const mark = JSON.parse(readFileSync(inRoot(MARK), 'utf8'))
  return mark.hash === hash && mark.buildId === buildId() && existsSync(inRoot('public/sw.js'))
}

/** Builds when the sources have changed since the last build. Says whether it did. */
export async function ensureBuilt({ show = true } = {}) {
  copyWasm()
  const hash = buildHash()
  if (isBuildCurrent(hash)) return false
  await step('Building the app for production (a minute or two)', async () => {
    const { code, output } = await tool('next/dist/bin/next', ['build', '--webpack'], { show })
    if (code !== 0) throw new Refusal(`${output}\nThe build failed; what it said is above. Nothing was started.`)
    // Of the sources as they were when the build began: an edit made meanwhile builds again.
    writeFileSync(inRoot(MARK), JSON.stringify({ hash, buildId: buildId() }))
  })
  return true
}

/** The decoder's wasm is served by ourselves: a crew phone without network could not fetch it from anywhere else. */
export function copyWasm() {
  const from = inRoot('node_modules/zxing-wasm/dist/reader/zxing_reader.wasm')
  const to = inRoot('public/wasm/zxing_reader.wasm')
  mkdirSync(inRoot('public/wasm'), { recursive: true })
  if (!existsSync(to) || !readFileSync(to).equals(readFileSync(from))) copyFileSync(from, to)
}

function buildId() {
  return readFileSync(inRoot('.next/BUILD_ID'), 'utf8').trim()
}
