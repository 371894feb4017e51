import { spawnSync } from 'node:child_process'

/** What Debian's `zbarimg` reads in a picture file, one text a code: a decoder that shares no code with ours. */
export function zbarimg(file: string): readonly string[] {
  const answer = spawnSync('zbarimg', ['--quiet', '--raw', '--oneshot', '-Sdisable', '-Sqrcode.enable', file], { encoding: 'utf8' })
  if (answer.error) throw new Error('The label tests need zbarimg. On Debian: apt-get install zbar-tools.', { cause: answer.error })
  // 4: there was no code in it, which is an answer; anything else is a fault of the file or the tool.
  if (answer.status !== 0 && answer.status !== 4) throw new Error(`zbarimg could not read ${file}: ${answer.stderr}`)
  return answer.stdout.split('\n').filter((line) => line !== '')
}
