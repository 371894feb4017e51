import type { Book, BookCheck } from '@/lib/checklist/book'
import type { PreCheck } from '@/lib/checklist/pre-check'
import type { ToMend } from '@/lib/contracts/my-entry'
import type { Head, SubjectState } from '@/lib/inspection/state'
import { explainJudgement } from '@/lib/rules/explain'
import { bringWords } from './bring-words'
import type { DeclaredItem } from './declared-items'

/** What would not be passed, and then what will be looked at, as declared. */
export function mendDeclared(items: readonly DeclaredItem[], book: Book, nameOf: (person: string) => string): readonly ToMend[] {
  const of = (says: PreCheck, weight: ToMend['weight']) =>
    items
      .filter((item) => item.preCheck === says)
      .map((item) => ({
        ...about(item.check, book),
        key: item.key,
        whose: item.person === null ? null : nameOf(item.person),
        weight,
        words: item.judgement ? explainJudgement(item.judgement.code, item.judgement.facts) : 'You say that it is not so.',
        bring: weight === 'fail' ? bringWords(item.check.rule?.name) : '',
      }))
  return [...of('would not be passed', 'fail'), ...of('will be looked at', 'advisory')]
}

/** What was not passed, and then what was noted, as somebody saw it. */
export function mendSeen(state: SubjectState, book: Book, whose: string | null): readonly ToMend[] {
  const of = (ids: readonly string[], weight: 'fail' | 'advisory') =>
    ids.flatMap((id) => {
      const check = book.byId.get(id)
      if (check === undefined) return []
      const words = headWords(state.checks.get(id)?.heads ?? [], check)
      const bring = weight === 'fail' ? 'Have it put right, then bring the car back to the bay.' : ''
      return [{ ...about(check, book), key: `${state.key} ${id}`, whose, weight, words, bring }]
    })
  return [...of(state.fails, 'fail'), ...of(state.advisories, 'advisory')]
}

function about(check: BookCheck, book: Book): Pick<ToMend, 'place' | 'prompt' | 'source'> {
  const place = book.checklist.places.find(({ id }) => id === check.place)?.title ?? ''
  const source = (check.source ?? []).map(({ title, edition, where, confidence }) => ({
    title,
    confidence,
    ...(edition === undefined ? {} : { edition }),
    ...(where === undefined ? {} : { where }),
  }))
  return { place, prompt: check.prompt, source }
}

/** What the last of those who looked said: the figure that decided, the reason chosen, or the chief's words. */
function headWords(heads: readonly Head[], check: BookCheck): string {
  const said = heads.filter(({ lapsed }) => !lapsed).map(({ record }) => record)
  const words = said.flatMap((record) => {
    if (record.kind === 'dispensation') return [`May run with conditions: ${record.conditions}`]
    if (record.kind === 'ruling') return [record.why]
    const judged =
      record.judgement && record.judgement.outcome !== 'ok' ? [explainJudgement(record.judgement.code, record.judgement.facts)] : []
    const reason = check.reasons.find(({ id }) => id === record.reason)?.text
    return [...judged, ...(reason === undefined ? [] : [`${reason}.`])]
  })
  return words.length === 0 ? 'The crew in the bay knows why.' : [...new Set(words)].join(' ')
}
