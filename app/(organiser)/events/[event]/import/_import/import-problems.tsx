import { DataTable, Td, Th } from '@/app/_ui/data-table'
import type { ImportAnswer } from './use-import'

/** Every problem with its row as the spreadsheet counts it. */
export function ImportProblems({ plan: { problems, problemCount } }: { readonly plan: ImportAnswer }) {
  const caption = problems.length < problemCount ? `The first ${problems.length} of ${problemCount} problems` : 'Problems'
  return (
    <DataTable caption={caption}>
      <thead>
        <tr>
          <Th>Row</Th>
          <Th>Column</Th>
          <Th>It says</Th>
          <Th>Why not</Th>
        </tr>
      </thead>
      <tbody>
        {problems.map(({ row, column, value, why }, index) => (
          <tr key={index}>
            <Th scope="row">{row}</Th>
            <Td className="whitespace-nowrap">{column === '' ? 'whole row' : column}</Td>
            <Td className="max-w-60 break-words">
              {value === '' ? <span className="text-muted">empty</span> : <span className="serial">{value}</span>}
            </Td>
            <Td className="min-w-64">{why}</Td>
          </tr>
        ))}
      </tbody>
    </DataTable>
  )
}
