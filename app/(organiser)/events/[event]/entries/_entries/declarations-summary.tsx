'use client'

import useSWR from 'swr'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { eventDeclarations, type EventDeclarations } from '@/lib/contracts/event-declarations'
import { callOrThrow, CallProblem } from '@/lib/http/call'

type Row = EventDeclarations['rows'][number]

const EVERY_MS = 60_000
/** Of the many who have not declared, the numbers are enough. */
const NAMED_AT_MOST = 200

/** Who has not declared, and what would not be passed as declared: to write to before the day, and to call first on it. */
export function DeclarationsSummary({ eventId }: { readonly eventId: string }) {
  const { data, error } = useSWR<EventDeclarations, unknown>(
    ['declarations', eventId],
    () => callOrThrow(eventDeclarations, { params: { event: eventId } }),
    { refreshInterval: EVERY_MS, shouldRetryOnError: false },
  )
  if (error instanceof CallProblem && !data) return <p role="status">Declarations: {error.problem.what}</p>
  if (!data) return <p role="status">Reading the declarations …</p>
  const failing = data.rows.filter(({ says }) => says === 'would not be passed')
  const silent = data.rows.filter(({ version }) => version === null)
  return (
    <section aria-label="Declarations" className="mb-6 grid gap-2 border-y-2 py-3">
      <p>
        <strong className="tabular-nums">
          {data.declared} of {data.entries}
        </strong>{' '}
        declared · <strong className="tabular-nums">{failing.length}</strong> would not be passed
      </p>
      {failing.length > 0 && (
        <details>
          <summary className="target flex cursor-pointer items-center font-bold text-accent underline underline-offset-4">
            What would not be passed
          </summary>
          <ul className="grid gap-2">
            {failing.map((row) => (
              <Failing key={row.entry} row={row} />
            ))}
          </ul>
        </details>
      )}
      {silent.length > 0 && (
        <details>
          <summary className="target flex cursor-pointer items-center font-bold text-accent underline underline-offset-4">
            Who has not declared ({silent.length})
          </summary>
          <p className="figures text-xl">
            {silent
              .slice(0, NAMED_AT_MOST)
              .map(({ number }) => number)
              .join(' · ')}
            {silent.length > NAMED_AT_MOST && ` and ${String(silent.length - NAMED_AT_MOST)} more`}
          </p>
        </details>
      )}
    </section>
  )
}

function Failing({ row }: { readonly row: Row }) {
  return (
    <li className="grid grid-cols-[auto_1fr] gap-x-3 border-b pb-2">
      <OutcomeShape state="fail" className="mt-1 size-6" />
      <div>
        <p>
          <span className="figures text-2xl">{row.number}</span> {row.model} · {row.drivers.join(', ')}
        </p>
        {row.worries
          .filter(({ weight }) => weight === 'fail')
          .map(({ prompt, words }) => (
            <p key={prompt}>
              {prompt}. {words}
            </p>
          ))}
      </div>
    </li>
  )
}
