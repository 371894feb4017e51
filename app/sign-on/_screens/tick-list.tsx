import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import { byFirstGroup } from '@/lib/desk/desk-people'
import { seatsInLine } from './person-row'
import type { AtDesk, Desk } from './use-desk'

type Ticked = AtDesk & { readonly briefing: 'open' | 'was there' | 'look at it' }

interface TickListProps {
  readonly people: readonly Ticked[]
  readonly groups: Desk['groups']
  readonly ticked: ReadonlySet<string>
  readonly onTicked: (ticked: ReadonlySet<string>) => void
  /** Few were looked for: no group needs a press for all of it. */
  readonly isSearch: boolean
}

/** People by group, each with a tick; a group at once with one press. Nobody is ticked beforehand. */
export function TickList({ people, groups, ticked, onTicked, isSearch }: TickListProps) {
  const byGroup = byFirstGroup(people, groups)
  const set = (ids: readonly string[], isOn: boolean) => {
    const next = new Set(ticked)
    for (const id of ids)
      if (isOn) next.add(id)
      else next.delete(id)
    onTicked(next)
  }
  if (people.length === 0) return <p>Nobody of this name, number or plate.</p>
  return (
    <>
      {groups.map(({ id, name }) => {
        const own = byGroup.get(id) ?? []
        const open = own.filter(({ briefing }) => briefing === 'open').map((person) => person.id)
        if (own.length === 0) return null
        return (
          <fieldset key={id} className="border-t border-line pt-2">
            <legend className="text-lg font-bold">
              {name}: {own.length - open.length} of {own.length} done
            </legend>
            {!isSearch && open.length > 0 && (
              <p className="flex flex-wrap gap-2">
                <Button look="quiet" onClick={() => set(open, true)}>
                  Tick all of {name}
                </Button>
                <Button look="quiet" onClick={() => set(open, false)}>
                  None
                </Button>
              </p>
            )}
            {own.map((person) => (
              <Choice
                key={person.id}
                checked={person.briefing === 'was there' || ticked.has(person.id)}
                disabled={person.briefing !== 'open'}
                onChange={(event) => set([person.id], event.target.checked)}
              >
                <span className="font-bold">{person.name}</span> {seatsInLine(person)}
                {person.briefing === 'was there' && ' · was there'}
                {person.briefing === 'look at it' && ' · something else was said: open the person'}
              </Choice>
            ))}
          </fieldset>
        )
      })}
    </>
  )
}
