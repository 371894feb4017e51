import { sizeInWords, type ChosenList, type ImportAnswer } from './use-import'

/** What the dry run counted, and what it left aside. */
export function ImportCounts({ list, plan }: { readonly list: ChosenList; readonly plan: ImportAnswer }) {
  const counts = [
    { label: 'would be added', count: plan.added },
    { label: 'would be changed', count: plan.changed },
    { label: 'already the same', count: plan.unchanged },
    { label: 'problems', count: plan.problemCount },
  ]
  return (
    <section aria-labelledby="dry-run" className="border-2 p-4">
      <h2 id="dry-run" className="text-2xl">
        Dry run of {list.fileName}
      </h2>
      <p className="text-muted">
        {sizeInWords(list.bytes)}, {plan.rowCount === 1 ? '1 row' : `${plan.rowCount} rows`}. Nothing has been written.
      </p>
      <dl className="mt-4 grid grid-cols-2 gap-4 sm:grid-cols-4">
        {counts.map(({ label, count }) => (
          <div key={label} className="flex flex-col-reverse justify-end">
            <dt>{label}</dt>
            <dd className="figures text-4xl">{count}</dd>
          </div>
        ))}
      </dl>
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
      {plan.newGroups.length > 0 && <p className="mt-3">New run groups: {plan.newGroups.join(', ')}. They have no first session yet.</p>}
      {plan.unusedHeadings.length > 0 && <p className="mt-3">Columns that are not used: {plan.unusedHeadings.join(', ')}.</p>}
    </section>
  )
}

function fieldInWords(field: string): string {
  return { passengerSeats: 'passengers', model: 'car', group: 'run group', name: 'driver', email: 'e-mail' }[field] ?? field
}
