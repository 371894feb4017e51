import { goTo } from '@/app/_crew/use-location'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { explainJudgement } from '@/lib/rules/explain'
import { rememberWalk } from '@/lib/walk/walk-memory'
import { subjectKey } from '@/lib/inspection/subject'
import type { Walk } from './use-walk'

/** What is open before the verdict: fails to be mended and seen again, advisories the driver is told, things nobody could see. */
export function OpenDefects({ walk, base }: { readonly walk: Walk; readonly base: string }) {
  const items = walk.plan
    .flatMap((place) => [...place.oneByOne, ...place.together].map((item) => ({ place: place.place, item })))
    .filter(({ item }) => ['fail', 'could-not-see', 'advisory', 'undecided'].includes(item.state?.standing ?? ''))
  if (items.length === 0) return null
  return (
    <section>
      <h2 className="text-lg">Open and noted</h2>
      <ul>
        {items.map(({ place, item }) => (
          <li key={item.check.id} className="border-t border-line">
            <button
              type="button"
              className="target flex w-full items-start gap-3 py-3 text-left"
              onClick={() => {
                rememberWalk(localStorage, subjectKey(walk.subject), { place: place.id, check: item.check.id, values: {}, at: Date.now() })
                goTo(`${base}/${place.id}`)
              }}
            >
              <OutcomeShape
                state={item.state?.standing === 'fail' ? 'fail' : item.state?.standing === 'advisory' ? 'advisory' : 'ask'}
                className="mt-1 size-6"
              />
              <span>
                <span className="font-bold">
                  {place.title}: {item.check.short}
                </span>
                <span className="block">{wordsOf(item)}</span>
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  )
}

function wordsOf({ check, state }: Walk['plan'][number]['oneByOne'][number]): string {
  const head = state?.heads.find(({ outcome }) => outcome === state.standing) ?? state?.heads[0]
  if (head?.record.kind === 'dispensation') return `accepted with conditions: ${head.record.conditions}`
  if (head?.record.kind !== 'finding') return state?.standing === 'could-not-see' ? 'could not see' : ''
  const { reason, judgement } = head.record
  const parts = [
    check.reasons.find(({ id }) => id === reason)?.text,
    judgement ? explainJudgement(judgement.code, judgement.facts) : undefined,
  ]
  return parts.filter(Boolean).join('. ') || (state?.standing === 'could-not-see' ? 'could not see' : check.prompt)
}
