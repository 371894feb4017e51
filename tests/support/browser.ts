import { existsSync } from 'node:fs'
import { type Browser, chromium } from 'playwright-core'

const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

/** Starts Debian's Chromium (or the one `CHROMIUM` names), with a camera that shows `camera` where given. No browser is a failure, never a skip. */
export async function launchBrowser(options: { readonly camera?: string; readonly args?: readonly string[] } = {}): Promise<Browser> {
  return chromium.launch({ executablePath: chromiumPath(), args: [...FLAGS, ...cameraFlags(options.camera), ...(options.args ?? [])] })
}

function chromiumPath(): string {
  const candidates = [process.env.CHROMIUM, '/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome']
  const found = candidates.find((path) => path !== undefined && existsSync(path))
  if (found === undefined)
    throw new Error('The browser tests need Chromium. On Debian: apt-get install chromium, or name one with CHROMIUM=/path.')
  return found
}

function cameraFlags(file: string | undefined): readonly string[] {
  if (file === undefined) return []
  return ['--use-fake-ui-for-media-stream', '--use-fake-device-for-media-stream', `--use-file-for-fake-video-capture=${file}`]
}
