import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import { COLUMN_NAMES, ENTRY_COLUMNS, type EntryColumn } from '@/lib/entries/entry-columns'
import { csvText } from '@/lib/platform/csv-text'
import type { ImportAnswer } from './import-words'
import type { ChosenList } from './read-file'
import type { ImportDesk } from './use-import'

interface ImportProblemsProps {
  readonly desk: ImportDesk
  readonly list: ChosenList
  readonly plan: ImportAnswer
}

/** Every problem with its row as the spreadsheet counts it; the cell can be put right here, or the row left out. */
export function ImportProblems({ desk, list, plan: { problems, problemCount } }: ImportProblemsProps) {
  const caption = problems.length < problemCount ? `The first ${problems.length} of ${problemCount} problems` : 'Problems'
  return (
    <div className="grid gap-3">
      <DataTable caption={caption}>
        <thead>
          <tr>
            <Th>Row</Th>
            <Th>Column</Th>
            <Th>It says</Th>
            <Th>Why not</Th>
            <Th>Put right</Th>
            <Th>Or</Th>
          </tr>
        </thead>
        <tbody>
          {problems.map((problem) => (
            <ProblemRow key={`${problem.row} ${problem.column} ${problem.why}`} desk={desk} problem={problem} />
          ))}
        </tbody>
      </DataTable>
      <div>
        <Button look="secondary" onClick={() => saveProblems(list.fileName, problems)}>
          Save the problems as CSV
        </Button>
      </div>
    </div>
  )
}

function ProblemRow({
  desk,
  problem: { row, column, value, why },
}: {
  readonly desk: ImportDesk
  readonly problem: ImportAnswer['problems'][number]
}) {
  const field = ENTRY_COLUMNS.find((one) => COLUMN_NAMES[one] === column)
  const { corrections, leftOut } = desk.said.choices
  const typed = corrections.find((one) => one.row === row && one.column === field)?.value
  const isOut = leftOut.includes(row)
  return (
    <tr>
      <Th scope="row">{row}</Th>
      <Td className="whitespace-nowrap">{column === '' ? 'whole row' : column}</Td>
      <Td className="max-w-60 break-words">
        {value === '' ? (
          <span className="text-muted">empty</span>
        ) : (
          <span className="serial">{value.length > 60 ? `${value.slice(0, 60)}…` : value}</span>
        )}
      </Td>
      <Td className="min-w-56">{why}</Td>
      <Td>
        {field !== undefined && (
          <input
            aria-label={`Row ${row}, ${column}, put right`}
            className="min-h-12 w-full min-w-32 rounded-sm border-2 border-line bg-ground px-2"
            value={typed ?? ''}
            disabled={isOut}
            onChange={({ target }) => correct(desk, row, field, target.value)}
          />
        )}
      </Td>
      <Td>
        <Choice
          className="whitespace-nowrap"
          checked={isOut}
          onChange={({ target }) => leaveOut(desk, row, target.checked)}
          aria-label={`Leave row ${row} out`}
        >
          leave it out
        </Choice>
      </Td>
    </tr>
  )
}

function correct(desk: ImportDesk, row: number, column: EntryColumn, value: string): void {
  desk.say((before) => {
    const others = before.choices.corrections.filter((one) => one.row !== row || one.column !== column)
    return { ...before, choices: { ...before.choices, corrections: [...others, { row, column, value }] } }
  })
}

function leaveOut(desk: ImportDesk, row: number, isOut: boolean): void {
  desk.say((before) => {
    const others = before.choices.leftOut.filter((one) => one !== row)
    return { ...before, choices: { ...before.choices, leftOut: isOut ? [...others, row] : others } }
  })
}

function saveProblems(fileName: string, problems: ImportAnswer['problems']): void {
  const rows = problems.map(({ row, column, value, why }) => [row, column, value, why])
  const url = URL.createObjectURL(new Blob([csvText([['Row', 'Column', 'It says', 'Why not'], ...rows])], { type: 'text/csv' }))
  const link = document.createElement('a')
  link.href = url
  link.download = `problems in ${fileName.replace(/\.[^.]*$/, '')}.csv`
  link.click()
  URL.revokeObjectURL(url)
}
