import { clockTime, dayWords } from '@/app/_crew/say-when'
import { HardLink } from '@/app/_ui/hard-link'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape, type OutcomeState } from '@/app/_ui/outcome-shape'
import type { HoldLine, Holds } from '@/lib/contracts/holds'

interface HoldListProps {
  readonly lines: readonly HoldLine[]
  readonly holds: Pick<Holds, 'day' | 'timeZone'>
}

/** Each hold, recall or dispensation: which car or person, why, since when and by whom, what is to be seen, and how it ended. */
export function HoldList({ lines, holds }: HoldListProps) {
  return (
    <ul>
      {lines.map((line) => (
        <li key={`${line.id} ${line.entry} ${line.person}`} className="grid grid-cols-[72px_minmax(0,1fr)] gap-x-4 border-t py-3">
          <NumberPlate number={line.number} size="row" className="self-start" />
          <div className="grid gap-1">
            <p className="flex items-start gap-2 text-lg font-bold">
              <OutcomeShape state={shapeOf(line)} className="mt-0.5 size-6" />
              <span>
                {line.what}
                {line.person !== '' && `: ${line.person}`}
              </span>
            </p>
            <p>{line.person === '' ? `${line.model}, ${line.plate}` : `named for ${line.plate}; the car itself is not held by it`}</p>
            <p>
              {whenWords(line.at, line.day, holds)}, by {line.by}
            </p>
            {line.seeAgain.length > 0 && <p>See again: {line.seeAgain.join(', ')}</p>}
            {line.alsoLook.length > 0 && <p>By eye, since the checklist has nothing for it: {line.alsoLook.join(', ')}</p>}
            {line.onlyChiefLifts && <p>Only the chief lifts it.</p>}
            {line.stickerRemoved === false && <p>Its sticker was left on.</p>}
            {line.ending && <p>{endingWords(line.ending, line.day, holds)}</p>}
            {line.state !== 'ended' && line.entry !== null && (
              <HardLink href={`/bay/car/${line.entry}`} className="target justify-self-start py-2 text-accent underline underline-offset-4">
                Open {line.number} in the bay
              </HardLink>
            )}
          </div>
        </li>
      ))}
    </ul>
  )
}

function shapeOf({ kind, state }: HoldLine): OutcomeState {
  if (state === 'ended') return 'na'
  if (kind === 'dispensation') return 'advisory'
  return state === 'standing' ? 'held' : 'none'
}

function whenWords(at: number, day: string, { day: today, timeZone }: HoldListProps['holds']): string {
  return `${day === today ? 'Today' : dayWords(day)}, ${clockTime(at, timeZone)}`
}

function endingWords({ how, at, by, why }: NonNullable<HoldLine['ending']>, day: string, { timeZone }: HoldListProps['holds']): string {
  if (how === 'dry' || at === null) return 'Ended when it was dry again.'
  const time = clockTime(at, timeZone)
  return how === 'seen' ? `Seen again, the last of it ${time} by ${by}.` : `Lifted ${time} by ${by}: ${why}`
}
