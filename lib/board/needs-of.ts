import type { Book } from '@/lib/checklist/book'
import { holdWords } from '@/lib/checklist/resolve-hold'
import { NEED_KINDS, type BoardRow } from '@/lib/contracts/board'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { QUARANTINE_WORDS } from '@/lib/inspection/quarantine-words'
import { isKnown } from '@/lib/inspection/record'
import type { Block, CheckState, SubjectState } from '@/lib/inspection/state'
import { isStandingWell } from '@/lib/inspection/verdict'

export type Need = BoardRow['needs'][number]

/** Names in a need before it only counts the rest. */
const NAMED = 3

/** Why a car needs somebody, in words, most pressing first; empty when nobody need do anything but go on. */
export function needsOfCar(state: SubjectState, setAside: readonly LogEntry[], book: Book | null): readonly Need[] {
  const checks = [...state.checks.values()]
  const named = (kind: Need['kind'], what: string, which: (check: CheckState) => boolean): readonly Need[] => {
    const ids = checks.filter(which).map(({ check }) => check)
    return ids.length === 0 ? [] : [{ kind, words: `${what}: ${nameChecks(ids, book)}` }]
  }
  const needs = [
    ...state.blocks.map((block): Need => ({ kind: 'held', words: blockInWords(block, book) })),
    ...named('not-passed', 'Not passed', ({ standing }) => standing === 'fail'),
    ...named('disagreement', 'Two who looked differ', ({ disagreement }) => disagreement),
    ...needsOfSetAside(state, setAside, book),
    ...named('could-not-see', 'Could not be seen', ({ standing, required }) => required && standing === 'could-not-see'),
    ...needsOfPasses(state),
  ]
  return needs.toSorted((a, b) => NEED_KINDS.indexOf(a.kind) - NEED_KINDS.indexOf(b.kind))
}

/** Why somebody aboard needs somebody; the car is not touched by it. */
export function needsOfPerson(name: string, state: SubjectState): readonly Need[] {
  if (state.verdict === 'held') return [{ kind: 'person', words: `${name} is held` }]
  if (state.verdict === 'not passed') return [{ kind: 'person', words: `${name} is not passed` }]
  return []
}

function needsOfPasses({ passes, verdict, withdrawn }: SubjectState): readonly Need[] {
  if (withdrawn) return []
  const inState = (state: 'live' | 'dead' | 'quarantined') => passes.filter((pass) => pass.state === state).length
  const live = inState('live')
  const setAside: readonly Need[] = inState('quarantined') > 0 ? [{ kind: 'set-aside', words: 'Its pass was set aside' }] : []
  if (live > 1) return [...setAside, { kind: 'two-passes', words: `${live} passes live at once: void all but one` }]
  const isPassed = verdict === 'passed' || verdict === 'passed with advisories'
  if (live === 1 || !isPassed) return setAside
  if (inState('dead') > 0) return [...setAside, { kind: 'pass-dead', words: 'Its pass no longer counts: issue a new one' }]
  return [...setAside, { kind: 'no-pass', words: 'Passed, but no pass issued' }]
}

/** Said until the check it was about stands well by somebody else's look: then nobody need do anything about it. */
function needsOfSetAside(state: SubjectState, setAside: readonly LogEntry[], book: Book | null): readonly Need[] {
  const open = setAside.flatMap(({ record, disposition }) => {
    if (disposition.state !== 'quarantined' || !isKnown(record) || !('check' in record)) return []
    const check = state.checks.get(record.check)
    if (check !== undefined && isStandingWell(check) && !check.heads.some(({ quarantined }) => quarantined)) return []
    return [{ check: record.check, code: disposition.code }]
  })
  const codes = [...new Set(open.map(({ code }) => code))]
  return codes.map((code) => {
    const ids = open.filter((one) => one.code === code).map(({ check }) => check)
    return { kind: 'set-aside', words: `A record was set aside, ${QUARANTINE_WORDS[code]}: ${nameChecks(ids, book)}` }
  })
}

function blockInWords({ kind, reason, stations, checksLeft, onlyChiefLifts }: Block, book: Book | null): string {
  const words = inASentence(holdWords(reason, book))
  const why = { hold: `Held: ${words}`, recall: 'Recall due', wet: 'Held: wet declared', unknown: 'Held by a newer version of the app' }[
    kind
  ]
  if (onlyChiefLifts) return `${why}; only the chief lifts it`
  const again = seeAgain(stations, checksLeft, book)
  return again === '' ? why : `${why}; see again ${again}`
}

/** Whole stations by their name, as the hold names them; checks of other stations one by one. */
function seeAgain(stations: readonly string[], checksLeft: readonly string[], book: Book | null): string {
  const stationOf = (check: string) => book?.byId.get(check)?.station ?? ''
  const touched = stations.filter((station) => checksLeft.length === 0 || checksLeft.some((check) => stationOf(check) === station))
  const others = checksLeft.filter((check) => !touched.includes(stationOf(check)))
  return nameSome([
    ...touched.map((id) => inASentence(book?.stations.get(id)?.short ?? id)),
    ...others.map((id) => book?.byId.get(id)?.short ?? id),
  ])
}

/** `Fluid dropped` as it stands within a sentence. */
function inASentence(words: string): string {
  return words.slice(0, 1).toLowerCase() + words.slice(1)
}

function nameChecks(ids: readonly string[], book: Book | null): string {
  return nameSome(ids.map((id) => book?.byId.get(id)?.short ?? id))
}

function nameSome(names: readonly string[]): string {
  // The same name comes once a corner; once is enough here.
  const unique = [...new Set(names)]
  const rest = unique.length - NAMED
  return rest > 0 ? `${unique.slice(0, NAMED).join(', ')} and ${rest} more` : unique.join(', ')
}
