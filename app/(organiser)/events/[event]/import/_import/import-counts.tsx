import type { ImportAnswer } from './import-words'
import { sizeInWords, type ChosenList } from './read-file'

/** What the dry run counted, and what it left aside. */
export function ImportCounts({ list, plan }: { readonly list: ChosenList; readonly plan: ImportAnswer }) {
  const counts = [
    { label: 'would be added', count: plan.added },
    { label: 'would be changed', count: plan.changed },
    { label: 'already the same', count: plan.unchanged },
    { label: 'problems', count: plan.problemCount },
    ...(plan.questionCount > 0 ? [{ label: 'open questions', count: plan.openQuestions }] : []),
  ]
  return (
    <section aria-labelledby="dry-run" className="border-2 p-4">
      <h2 id="dry-run" className="text-2xl">
        Dry run of {list.fileName}
      </h2>
      <p className="text-muted">
        {sizeInWords(list.bytes)}, {plan.rowCount === 1 ? '1 row' : `${plan.rowCount} rows`}. Nothing has been written.
      </p>
      <dl className="mt-4 grid grid-cols-2 gap-4 sm:grid-cols-5">
        {counts.map(({ label, count }) => (
          <div key={label} className="flex flex-col-reverse justify-end">
            <dt>{label}</dt>
            <dd className="figures text-4xl">{count}</dd>
          </div>
        ))}
      </dl>
      {plan.people > 0 && (
        <p className="mt-3">
          {plan.people === 1 ? '1 person sits' : `${plan.people} people sit`} in the entries added or changed: each needs one band, whatever
          cars they drive.
        </p>
      )}
      {plan.changes.length > 0 && (
        <details className="mt-4">
          <summary className="target flex items-center font-bold text-accent">What would be changed</summary>
          <ul className="columns-1 sm:columns-2">
            {plan.changes.map(({ number, fields }) => (
              <li key={number}>
                <span className="font-bold">{number}</span>: {fields.map(fieldInWords).join(', ')}
              </li>
            ))}
          </ul>
        </details>
      )}
      {plan.notInList > 0 && (
        <p className="mt-3">
          {plan.notInList === 1 ? '1 entry of this event is' : `${plan.notInList} entries of this event are`} not in this list. They stay as
          they are.
        </p>
      )}
      {plan.newGroups.length > 0 && <p className="mt-3">New run groups: {plan.newGroups.join(', ')}. They have no first session yet.</p>}
    </section>
  )
}

function fieldInWords(field: string): string {
  return { passengerSeats: 'passengers', model: 'car', group: 'run group', name: 'name', email: 'e-mail', note: 'notes' }[field] ?? field
}
