import { existsSync } from 'node:fs'
import { run } from './run.mjs'
import { step } from './say.mjs'
import { chromiumPath, onPath } from './toolchain.mjs'

/** Installs Chromium and zbarimg through apt where it may. Gives a sentence for what is still missing, null when all is there. */
export async function ensureBrowserTools() {
  if (missing().length > 0 && process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    await step(`Installing ${missing().join(' and ')} with apt-get`, aptInstall)
  }
  const lacking = missing()
  if (lacking.length === 0) return null
  return `The browser tests need ${lacking.join(' and ')}, which this account may not install. On Debian: sudo apt-get install ${lacking.join(' ')}. Until then they count as failed.`
}

function missing() {
  return [chromiumPath() === null ? 'chromium' : null, onPath('zbarimg') === null ? 'zbar-tools' : null].filter((name) => name !== null)
}

async function aptInstall() {
  const env = { DEBIAN_FRONTEND: 'noninteractive' }
  await run('apt-get', ['update', '-qq'], { env, show: false })
  const { code, output } = await run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...missing()], { env, show: false })
  if (code !== 0) process.stdout.write(output)
}
