import { DataTable, Td, Th } from '@/app/_ui/data-table'
import type { TimetableBlockBody } from '@/lib/contracts/events'
import { KIND_WORDS } from './kind-words'

interface DayTableProps {
  readonly groups: readonly { readonly id: string; readonly name: string }[]
  readonly lines: readonly TimetableBlockBody[]
}

/** One day's timetable to read. */
export function DayTable({ groups, lines }: DayTableProps) {
  if (lines.length === 0) return <p className="text-muted">Nothing is planned for this day yet.</p>
  const names = new Map(groups.map(({ id, name }) => [id, name]))
  return (
    <DataTable caption="Venue time">
      <thead>
        <tr>
          <Th>From</Th>
          <Th>To</Th>
          <Th>What</Th>
          <Th>Whose</Th>
          <Th className="text-right">Noise limit, dB(A)</Th>
        </tr>
      </thead>
      <tbody>
        {lines.map(({ kind, group, startsAt, endsAt, noiseLimitDb }) => (
          <tr key={`${startsAt} ${kind} ${group ?? ''}`}>
            <Td className="tabular-nums">{startsAt}</Td>
            <Td className="tabular-nums">{endsAt}</Td>
            <Td>{KIND_WORDS[kind]}</Td>
            <Td>{group === null ? 'everybody' : (names.get(group) ?? 'a group that is gone')}</Td>
            <Td isNumber>{noiseLimitDb ?? ''}</Td>
          </tr>
        ))}
      </tbody>
    </DataTable>
  )
}
