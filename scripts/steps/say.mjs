// Plain sentences on the terminal, with how long each step took.

/** Prints one sentence. */
export function say(sentence) {
  process.stdout.write(`${sentence}\n`)
}

/** Says what begins, does it, says how long it took; gives back what the work gave. */
export async function step(sentence, work) {
  say(`· ${sentence} …`)
  const began = performance.now()
  const result = await work()
  say(`  done in ${seconds(performance.now() - began)}`)
  return result
}

/** `1.2 s`, `2 min 5 s`. */
export function seconds(ms) {
  if (ms < 60_000) return `${(ms / 1000).toFixed(1)} s`
  return `${Math.floor(ms / 60_000)} min ${Math.round((ms % 60_000) / 1000)} s`
}

/** An expected failure: its message is all a person needs, no stack. */
export class Refusal extends Error {}

/** Runs a script's main work: a Refusal ends it with its sentence, anything else with its stack. */
export async function main(work) {
  try {
    await work()
  } catch (error) {
    process.stderr.write(`\n${error instanceof Refusal ? error.message : (error.stack ?? error)}\n`)
    process.exitCode = 1
  }
}
