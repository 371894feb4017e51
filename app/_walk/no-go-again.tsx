import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { WalkPlace } from '@/lib/walk/walk-plan'
import type { WalkStop } from '@/lib/walk/next-stop'
import { STATE_WORDS, stateOf } from './stop-picker'

/** Before the verdict every no-go item is shown once more, as it stands; a press opens its place. */
export function NoGoAgain({ plan, onPick }: { readonly plan: readonly WalkPlace[]; readonly onPick: (stop: WalkStop) => void }) {
  const places = plan
    .map(({ place, oneByOne }) => ({ place, items: oneByOne.filter(({ check }) => check.critical) }))
    .filter(({ items }) => items.length > 0)
  if (places.length === 0) return null
  return (
    <section aria-labelledby="no-go-again">
      <h2 id="no-go-again" className="text-lg">
        No-go items, once more
      </h2>
      <ul>
        {places.map(({ place, items }) => (
          <li key={place.id} className="border-t border-line">
            <button
              type="button"
              className="target w-full py-2 text-left"
              onClick={() => onPick({ place: place.id, check: items[0]?.check.id ?? null })}
            >
              <span className="block font-bold">{place.title}</span>
              <span className="flex flex-wrap gap-x-4 gap-y-1">
                {items.map((item) => (
                  <span key={item.check.id} className="flex items-center gap-2">
                    <OutcomeShape state={stateOf(item)} className="size-5" label={STATE_WORDS[stateOf(item)]} />
                    {item.check.short}
                  </span>
                ))}
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  )
}
