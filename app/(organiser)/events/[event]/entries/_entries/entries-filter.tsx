import { SelectField, TextField } from '@/app/_ui/field'
import type { BoardGroup } from '@/lib/contracts/board'
import { MISSING_WORDS } from '@/lib/entries/missing-data'
import { VERDICTS } from '@/lib/inspection/state'

interface EntriesFilterProps {
  readonly text: string
  readonly onText: (text: string) => void
  readonly groups: readonly Pick<BoardGroup, 'id' | 'name'>[]
  readonly filterOf: (column: 'group' | 'verdict' | 'missing') => string
  readonly onFilter: (column: 'group' | 'verdict' | 'missing', value: string) => void
}

/** What is shown of the entries. An empty choice shows all. */
export function EntriesFilter({ text, onText, groups, filterOf, onFilter }: EntriesFilterProps) {
  const select = (column: 'group' | 'verdict' | 'missing') => ({
    value: filterOf(column),
    onChange: ({ target }: { readonly target: { readonly value: string } }) => onFilter(column, target.value),
  })
  return (
    <search className="grid grid-cols-2 gap-4 lg:grid-cols-4">
      <div className="col-span-2 lg:col-span-1">
        <TextField
          label="Find"
          type="search"
          placeholder="Number, plate, car or name"
          autoComplete="off"
          spellCheck={false}
          value={text}
          onChange={({ target }) => onText(target.value)}
        />
      </div>
      <SelectField label="Run group" {...select('group')}>
        <option value="">all</option>
        {groups.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </SelectField>
      <SelectField label="Verdict" {...select('verdict')}>
        <option value="">all</option>
        {VERDICTS.map((verdict) => (
          <option key={verdict}>{verdict}</option>
        ))}
      </SelectField>
      <SelectField label="Missing" {...select('missing')}>
        <option value="">all</option>
        <option value="any">anything</option>
        {Object.entries(MISSING_WORDS).map(([value, words]) => (
          <option key={value} value={value}>
            {words}
          </option>
        ))}
      </SelectField>
    </search>
  )
}
