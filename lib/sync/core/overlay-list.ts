import type { Verdict } from '@/lib/inspection/state'
import type { ListedEntry, ListedPass, ListedPerson } from '@/lib/pass/pass-list'

/** Verdicts of the server's list that only the server's next list takes away: a device adds blocks, it lifts none. */
const STICKS: readonly Verdict[] = ['withdrawn', 'held', 'not passed']

/**
 * A line of the server's list with what this device's own log says of the entry. The own line may add a block, kill a pass, bring a new pass or band and move
 * a verdict on; it ends no block and revives nothing.
 */
export function overlayEntry(listed: ListedEntry, own: ListedEntry): ListedEntry {
  const known = new Set(listed.blocks.map(({ kind, words }) => `${kind} ${words}`))
  const before = new Set(listed.passes.map(({ id }) => id))
  const aboard = new Set(listed.people.map(({ person }) => person))
  return {
    ...listed,
    number: own.number,
    plateTail: own.plateTail,
    group: own.group,
    groupName: own.groupName,
    verdict: STICKS.includes(listed.verdict) && !STICKS.includes(own.verdict) ? listed.verdict : own.verdict,
    blocks: [...own.blocks.filter(({ kind, words }) => !known.has(`${kind} ${words}`)), ...listed.blocks],
    passes: [...listed.passes.map((pass) => overlayPass(pass, own.passes)), ...own.passes.filter(({ id }) => !before.has(id))],
    // Somebody seated at the desk since: they ride, and without a band they do not.
    people: [
      ...listed.people.map((person) => overlayPerson(person, own.people)),
      ...own.people.filter(({ person }) => !aboard.has(person)),
    ],
  }
}

function overlayPass(listed: ListedPass, own: readonly ListedPass[]): ListedPass {
  const here = own.find(({ id }) => id === listed.id)
  return listed.state === 'live' && here !== undefined && here.state !== 'live' ? { ...listed, state: here.state, why: here.why } : listed
}

function overlayPerson(listed: ListedPerson, own: readonly ListedPerson[]): ListedPerson {
  const here = own.find(({ person }) => person === listed.person)
  return here === undefined || listed.band === 'held' || listed.fit === 'failed' ? listed : here
}

/** Whether the list already reflects these records: none of them is unsent or newer. */
export function isReflected(seqs: Iterable<number | null>, listSeq: number): boolean {
  for (const seq of seqs) if (seq === null || seq > listSeq) return false
  return true
}
