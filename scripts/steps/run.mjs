import { spawn } from 'node:child_process'
import { root } from './root.mjs'

const running = new Set()

/** The environment for everything these scripts start. NODE_ENV is dropped: `production` in the caller's shell would leave out what the build needs. */
export function childEnv(extra = {}) {
  const { NODE_ENV: _dropped, ...rest } = process.env
  return { ...rest, NEXT_TELEMETRY_DISABLED: '1', ...extra }
}

/**
 * Runs a command in its own process group and waits for it.
 * `show`: true passes its output through, false collects it. Resolves to `{ code, output }`, also when it fails; 124 when `timeoutMs` ran out.
 */
export function run(command, args, { env = {}, show = true, timeoutMs = 0, cwd = root } = {}) {
  return new Promise((done) => {
    const child = start(command, args, { env, cwd, stdio: show ? ['ignore', 'inherit', 'inherit'] : ['ignore', 'pipe', 'pipe'] })
    let output = ''
    let late = false
    child.stdout?.on('data', (chunk) => (output += chunk))
    child.stderr?.on('data', (chunk) => (output += chunk))
    const timer = timeoutMs > 0 ? setTimeout(() => ((late = true), endGroup(child, 'SIGKILL')), timeoutMs) : null
    child.on('error', (error) => (output += `${command} could not be started: ${error.message}\n`))
    child.on('close', (code) => {
      if (timer) clearTimeout(timer)
      if (late) output += `\nstopped: it took longer than ${Math.round(timeoutMs / 1000)} s\n`
      done({ code: late ? 124 : (code ?? 1), output })
    })
  })
}

/** Starts a command in its own process group, remembered until it ends. */
export function start(command, args, { env = {}, cwd = root, stdio = 'inherit' } = {}) {
  const child = spawn(command, args, { cwd, env: childEnv(env), stdio, detached: true })
  running.add(child)
  child.on('exit', () => running.delete(child))
  child.on('error', () => running.delete(child))
  return child
}

/** Runs the project's own copy of a tool: `tool('next/dist/bin/next', ['build'])`. */
export function tool(script, args, options) {
  return run(process.execPath, [`${root}/node_modules/${script}`, ...args], options)
}

/** Ends a child and whatever it started. */
export function endGroup(child, signal = 'SIGTERM') {
  if (child.pid === undefined) return
  try {
    process.kill(-child.pid, signal)
  } catch (error) {
    if (error.code !== 'ESRCH') throw error
  }
}

/** Ends everything still running: asks first, insists after three seconds. */
export async function endAll() {
  const children = [...running]
  for (const child of children) endGroup(child, 'SIGTERM')
  const gone = Promise.all(children.map((child) => new Promise((done) => (running.has(child) ? child.once('exit', done) : done()))))
  const late = new Promise((done) => setTimeout(done, 3000, 'late').unref())
  if ((await Promise.race([gone, late])) === 'late') for (const child of children) endGroup(child, 'SIGKILL')
}

/** Makes Ctrl-C, SIGTERM and a closed terminal end all that was started, then this process. */
export function endAllOnSignals(after = () => undefined) {
  let ending = false
  const end = (signal) => {
    if (ending) return
    ending = true
    after(signal)
    endAll().then(() => process.exit(signal === 'SIGINT' ? 130 : 143))
  }
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => end(signal))
  return end
}
