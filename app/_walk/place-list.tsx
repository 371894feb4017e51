import { goTo } from '@/app/_crew/use-location'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { WalkPlace } from '@/lib/walk/walk-plan'

const WORST = { ok: 'ok', advisory: 'advisory', fail: 'fail', 'could-not-see': 'ask', none: 'none' } as const

/** The places of the walk in order, each with its worst outcome and its holes. */
export function PlaceList({ plan, base }: { readonly plan: readonly WalkPlace[]; readonly base: string }) {
  return (
    <nav aria-label="Places">
      <ol>
        {plan.map((place) => (
          <li key={place.place.id} className="border-t border-line">
            <button
              type="button"
              className="target flex w-full items-center gap-3 py-3 text-left"
              onClick={() => goTo(`${base}/${place.place.id}`)}
            >
              <OutcomeShape state={place.unanswered > 0 && place.worst === 'ok' ? 'none' : WORST[place.worst]} className="size-7" />
              <span className="grow font-bold">{place.place.title}</span> <span className="text-muted">{holes(place)}</span>
            </button>
          </li>
        ))}
      </ol>
    </nav>
  )
}

function holes({ unanswered, missing, seeAgain }: WalkPlace): string {
  if (unanswered === 0) return 'closed'
  const optional = unanswered - missing
  return [
    missing > 0 ? `${missing} to see` : '',
    seeAgain > 0 ? (seeAgain === missing ? 'again' : `${seeAgain} of them again`) : '',
    optional > 0 ? `${optional} optional` : '',
  ]
    .filter((part) => part !== '')
    .join(', ')
    .replace('see, again', 'see again')
}
