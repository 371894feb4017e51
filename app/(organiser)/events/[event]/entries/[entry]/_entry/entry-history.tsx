import type { EntryEvent } from '@/lib/entries/entry-view'

/** What became of the entry, newest first. What is signed in the day's log says so. */
export function EntryHistory({ history, timeZone }: { readonly history: readonly EntryEvent[]; readonly timeZone: string }) {
  const clock = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    weekday: 'short',
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
  })
  return (
    <section aria-labelledby="entry-history">
      <h3 id="entry-history" className="text-2xl">
        What became of it
      </h3>
      {history.length === 0 && <p className="mt-2">Nothing yet: it stands as it was entered.</p>}
      <ol className="mt-2">
        {history.map(({ at, who, words, isRecord }, index) => (
          <li key={index} className="border-b py-2">
            <p className="font-bold">{words}</p>
            <p className="text-muted">
              {clock.format(at).replaceAll(',', '')} · {who}
              {isRecord ? ' · signed in the log' : ''}
            </p>
          </li>
        ))}
      </ol>
    </section>
  )
}
