import { VERDICT_SHAPES } from '@/app/_walk/verdict-words'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { MyEntry } from '@/lib/contracts/my-entry'

/** Who sits in the car, and whether sign-on has banded them: nobody without a band sits in a car. */
export function PeopleList({ people }: Pick<MyEntry, 'people'>) {
  return (
    <section aria-labelledby="people" className="grid gap-2">
      <h2 id="people" className="text-xl">
        Who sits in it
      </h2>
      <ul className="grid gap-2">
        {people.map(({ id, name, role, isMe, verdict, band }) => (
          <li key={`${id} ${role}`} className="grid grid-cols-[auto_1fr] items-center gap-x-3 border-b py-2">
            <OutcomeShape
              state={band === null ? VERDICT_SHAPES[verdict === 'passed' ? 'not presented' : verdict] : 'ok'}
              className="size-7"
            />
            <p>
              <strong>{name}</strong>, {role}
              {isMe && ' (you)'}
              <span className="block text-muted">{band === null ? 'No band yet: go to sign-on.' : `Band ${band}`}</span>
            </p>
          </li>
        ))}
      </ul>
    </section>
  )
}
