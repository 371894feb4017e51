import { buttonClass } from '@/app/_ui/button'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import { EmptyState } from '@/app/_ui/empty-state'
import type { StationCount } from '@/lib/reports/station-counts'

interface ReportScreenProps {
  readonly eventId: string
  readonly records: number
  readonly setAside: number
  readonly counts: readonly StationCount[]
}

/** What was checked, station by station, and the whole log to keep. */
export function ReportScreen({ eventId, records, setAside, counts }: ReportScreenProps) {
  if (records === 0)
    return (
      <EmptyState title="Nothing was recorded yet">
        As soon as the first car or person has been seen, what was found stands here, and the whole record can be kept as a file.
      </EmptyState>
    )
  return (
    <div className="grid gap-8">
      <section className="grid gap-3" aria-labelledby="files">
        <h2 id="files" className="text-2xl">
          The record
        </h2>
        <p className="max-w-prose">
          {records === 1 ? '1 record' : `${records} records`}
          {setAside > 0 && `, ${setAside} of them set aside`}. Each is signed by a device and attributed to the person unlocked on it.
          Nobody can change or tidy it.
        </p>
        <div className="flex flex-wrap gap-4">
          <a className={buttonClass('primary')} href={`/api/events/${eventId}/report/csv`} download>
            In words, as CSV
          </a>
          <a className={buttonClass('secondary')} href={`/api/events/${eventId}/report/json`} download>
            As it was signed, as JSON
          </a>
        </div>
      </section>
      <Stations counts={counts} />
      <p className="max-w-prose border-t pt-4 text-muted">
        A record says what was seen that day without dismantling, by these checks and limits alone. It is no certificate and no warranty.
        Venue, national rules, road law and makers stand above it.
      </p>
    </div>
  )
}

function Stations({ counts }: { readonly counts: readonly StationCount[] }) {
  return (
    <DataTable caption="What was found, look by look">
      <thead>
        <tr>
          <Th>Station</Th>
          <Th className="text-right">Cars or people</Th>
          <Th className="text-right">Ok</Th>
          <Th className="text-right">Advisory</Th>
          <Th className="text-right">Fail</Th>
          <Th className="text-right">Could not see</Th>
          <Th className="text-right">Put right here</Th>
        </tr>
      </thead>
      <tbody>
        {counts.map(({ station, title, subjects, ok, advisory, fail, couldNotSee, putRight }) => (
          <tr key={station}>
            <Th scope="row">{title}</Th>
            {[subjects, ok, advisory, fail, couldNotSee, putRight].map((count, index) => (
              <Td key={index} isNumber>
                {count}
              </Td>
            ))}
          </tr>
        ))}
      </tbody>
    </DataTable>
  )
}
