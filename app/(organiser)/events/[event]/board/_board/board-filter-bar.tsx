import { SelectField, TextField } from '@/app/_ui/field'
import type { BoardFilter } from '@/lib/board/filter-rows'
import type { BoardRow } from '@/lib/contracts/board'
import { type Verdict, VERDICTS } from '@/lib/inspection/state'

interface BoardFilterBarProps {
  readonly filter: BoardFilter
  readonly onChange: (filter: BoardFilter) => void
  /** All rows, for the counts. */
  readonly rows: readonly BoardRow[]
  readonly shown: number
}

/** As people scan for them: what runs first, what is missing last. */
const ORDER: readonly Verdict[] = [...VERDICTS].reverse()

/** Finds by number, plate or name, and shows one verdict at a time. */
export function BoardFilterBar({ filter, onChange, rows, shown }: BoardFilterBarProps) {
  const count = (verdict: Verdict) => rows.filter((row) => row.verdict === verdict).length
  const needing = rows.filter(({ needs }) => needs.length > 0).length
  return (
    <search className="flex flex-wrap items-start gap-4">
      <div className="min-w-0 grow basis-64 sm:max-w-96">
        <TextField
          label="Find"
          type="search"
          placeholder="Number, plate or name"
          autoComplete="off"
          spellCheck={false}
          value={filter.text}
          onChange={({ target }) => onChange({ ...filter, text: target.value })}
        />
      </div>
      <div className="grow basis-64 sm:max-w-80">
        <SelectField
          label="Show"
          value={filter.show}
          onChange={({ target }) => onChange({ ...filter, show: target.value as BoardFilter['show'] })}
        >
          <option value="all">all verdicts, {rows.length}</option>
          <option value="needs-somebody">needs somebody, {needing}</option>
          {ORDER.map((verdict) => (
            <option key={verdict} value={verdict}>
              {verdict}, {count(verdict)}
            </option>
          ))}
        </SelectField>
      </div>
      <p role="status" className="sr-only">
        {shown} of {rows.length} entries shown
      </p>
    </search>
  )
}
