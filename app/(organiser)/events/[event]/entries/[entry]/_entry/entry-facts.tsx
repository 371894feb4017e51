import type { EntryView } from '@/lib/entries/entry-view'

/** The entry for who may look and not change. */
export function EntryFacts({ view: { values, groups, facts } }: { readonly view: EntryView }) {
  const told = facts.flatMap(({ name, label, values: possible }) => {
    const value = possible.find((one) => one.value === values.facts[name])
    return value === undefined ? [] : [{ label, value: value.label }]
  })
  const lines = [
    { label: 'Run group', value: groups.find(({ id }) => id === values.group)?.name ?? 'no group' },
    { label: 'Passenger seats', value: String(values.passengerSeats) },
    { label: 'Note', value: values.note === '' ? 'none' : values.note },
    ...told,
    ...values.people.map(({ role, name }) => ({ label: role.charAt(0).toUpperCase() + role.slice(1), value: name })),
  ]
  return (
    <section aria-labelledby="entry-facts">
      <h3 id="entry-facts" className="text-2xl">
        The entry
      </h3>
      <dl className="mt-2 grid grid-cols-[max-content_minmax(0,1fr)] gap-x-6 gap-y-2">
        {lines.map(({ label, value }, index) => (
          <div key={index} className="contents">
            <dt className="text-muted">{label}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
    </section>
  )
}
