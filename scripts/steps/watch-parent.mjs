import { execFileSync } from 'node:child_process'
import { readFileSync } from 'node:fs'

/**
 * Calls `gone` once npm, which started us, is no more: npm killed by a SIGTERM does not pass it on, and the server would stay for ever.
 * Not run by npm: nothing to watch, so `nohup node scripts/demo.mjs &` outlives its shell.
 */
export function watchParent(gone) {
  if (process.env.npm_lifecycle_event === undefined) return
  const parent = process.ppid
  // npm runs us through `sh -c`, which stays in between with some shells and would hide that npm has gone.
  const grandparent = nameOf(parent).endsWith('sh') ? parentOf(parent) : null
  const timer = setInterval(() => {
    if (process.ppid === parent && (grandparent === null || parentOf(parent) === grandparent)) return
    clearInterval(timer)
    gone()
  }, 500)
  timer.unref()
}

function nameOf(pid) {
  return ask(pid, 'comm')
}

function parentOf(pid) {
  const answer = Number(ask(pid, 'ppid'))
  return Number.isInteger(answer) && answer > 0 ? answer : null
}

/** One fact of a process; from /proc where there is one, as that costs nothing twice a second. Empty when the process is gone. */
function ask(pid, what) {
  try {
    if (process.platform !== 'linux') return execFileSync('ps', ['-o', `${what}=`, '-p', String(pid)], { encoding: 'utf8' }).trim()
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    const close = stat.lastIndexOf(')')
    return what === 'comm' ? stat.slice(stat.indexOf('(') + 1, close) : stat.slice(close + 2).split(' ')[1]
  } catch {
    return ''
  }
}
