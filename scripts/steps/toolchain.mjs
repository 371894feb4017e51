import { accessSync, constants, existsSync, realpathSync } from 'node:fs'
import { delimiter, dirname, join, resolve } from 'node:path'
import { Refusal, say } from './say.mjs'

/** Refuses a Node that cannot work, and says so of one that nobody has tried. */
export function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  if (major < 20 || (major === 20 && minor < 9)) {
    throw new Refusal(`Lockwire needs Node 20 (20.9 or newer); this is ${process.version}. Install Node 20 and run the same command again.`)
  }
  if (major > 20)
    say(`  Note: Lockwire is made for and tested on Node 20; this is ${process.version}. Should something break, use Node 20.`)
}

/** Which of the tools that compile better-sqlite3 are not on this machine. */
export function missingCompilers() {
  const missing = [
    ['c++', 'g++', 'clang++'],
    ['make', 'gmake'],
    ['python3', 'python'],
  ].filter((names) => !names.some(onPath))
  return missing.map((names) => (names[0] === 'c++' ? 'a C++ compiler (g++)' : names[0]))
}

/** Where a program is, or null. */
export function onPath(name) {
  for (const folder of (process.env.PATH ?? '').split(delimiter)) {
    const file = join(folder, name)
    try {
      accessSync(file, constants.X_OK)
      return file
    } catch {
      // not in this folder
    }
  }
  return null
}

/** The folder that holds Node's own headers beside its binary, for node-gyp without a download; null where there are none. */
export function ownNodeHeaders() {
  for (const binary of [process.execPath, realpathSync(process.execPath)]) {
    const prefix = resolve(dirname(binary), '..')
    if (existsSync(join(prefix, 'include/node/node.h'))) return prefix
  }
  return null
}

/** Debian's Chromium (or the one `CHROMIUM` names), or null. */
export function chromiumPath() {
  if (process.env.CHROMIUM) return process.env.CHROMIUM
  return onPath('chromium') ?? onPath('chromium-browser') ?? onPath('google-chrome')
}
