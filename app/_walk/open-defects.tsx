'use client'

import { useDay } from '@/app/_crew/day-context'
import { KeptPhotos } from '@/app/_crew/kept-photos'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { WalkItem, WalkPlace } from '@/lib/walk/walk-plan'
import { headWords } from './head-words'
import { openStop } from './open-stop'
import { STATE_WORDS, stateOf } from './stop-picker'
import type { Walk } from './use-walk'

/** Open: a fail to be mended and seen again, what nobody could see or decide. Noted: an advisory the driver is told. */
const OPEN_OR_NOTED: readonly string[] = ['fail', 'could-not-see', 'advisory', 'undecided']

/** What is open before the verdict, each a way to its check. */
export function OpenDefects({ walk, base }: { readonly walk: Walk; readonly base: string }) {
  const lines = walk.plan.flatMap(({ place, oneByOne, together }) =>
    [...oneByOne, ...together]
      .filter(({ state }) => OPEN_OR_NOTED.includes(state?.standing ?? '') || state?.disagreement)
      .map((item) => ({ place, item })),
  )
  if (lines.length === 0) return null
  return (
    <section aria-labelledby="open-and-noted">
      <h2 id="open-and-noted" className="text-lg">
        Open and noted
      </h2>
      <ul>
        {lines.map(({ place, item }) => (
          <DefectLine
            key={item.check.id}
            place={place}
            item={item}
            onPick={() => openStop(walk.subject, base, { place: place.id, check: item.check.id })}
          />
        ))}
      </ul>
    </section>
  )
}

interface DefectLineProps {
  readonly place: WalkPlace['place']
  readonly item: WalkItem
  readonly onPick: () => void
}

function DefectLine({ place, item, onPick }: DefectLineProps) {
  const day = useDay()
  const { check, state } = item
  const head = state?.heads.find(({ outcome }) => outcome === state.standing) ?? state?.heads[0]
  const words = head ? headWords(head, check, day.note) : ''
  return (
    <li className="border-t border-line">
      <button type="button" className="target flex w-full items-start gap-3 py-3 text-left" onClick={onPick}>
        <OutcomeShape state={stateOf(item)} className="mt-1 size-6" label={STATE_WORDS[stateOf(item)]} />
        <span>
          <span className="font-bold">
            {place.title}: {check.short}
          </span>
          {state?.disagreement && <span className="block font-bold">Two looks differ.</span>}
          <span className="block">{words || (state?.standing === 'could-not-see' ? 'could not see' : check.prompt)}</span>
        </span>
      </button>
      {head && <KeptPhotos record={head.record} words={`${check.short}, ${head.outcome}`} />}
    </li>
  )
}
