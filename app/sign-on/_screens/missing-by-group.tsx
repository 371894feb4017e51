import { EmptyState } from '@/app/_ui/empty-state'
import { byFirstGroup } from '@/lib/desk/desk-people'
import { PersonRow } from './person-row'
import type { Desk } from './use-desk'

/** Who has no band yet, group by group in running order. Somebody with cars in two groups stands in the earlier. */
export function MissingByGroup({ desk: { people, groups } }: { readonly desk: Desk }) {
  if (people.length === 0)
    return (
      <EmptyState title="Nobody is entered yet">
        Whoever is entered since this device last heard from the server comes with the next pull.
      </EmptyState>
    )
  const byGroup = byFirstGroup(people, groups)
  return (
    <section aria-labelledby="missing">
      <h2 id="missing" className="text-lg">
        Still missing
      </h2>
      {groups.map(({ id, name }) => {
        const own = byGroup.get(id) ?? []
        const missing = own.filter(({ stands }) => stands.is !== 'banded')
        if (own.length === 0) return null
        return (
          <details key={id} className="border-t border-line" open={missing.length > 0 && missing.length <= OPEN_UP_TO}>
            <summary className="target cursor-pointer py-3">
              <span className="font-bold">{name}</span>: {own.length - missing.length} of {own.length} banded
              {missing.length > 0 && `, ${missing.length} missing`}
            </summary>
            <ul>
              {missing.map((person) => (
                <PersonRow key={person.id} person={person} />
              ))}
            </ul>
          </details>
        )
      })}
    </section>
  )
}

/** A group is shown at once when so few are left that one would call them out. */
const OPEN_UP_TO = 6
