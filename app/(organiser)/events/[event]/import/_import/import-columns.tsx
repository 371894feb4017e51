'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import { SelectField, TextField } from '@/app/_ui/field'
import { COLUMN_NAMES, ENTRY_COLUMNS, type EntryColumn } from '@/lib/entries/entry-columns'
import type { Choices, ImportAnswer } from './import-words'
import type { ImportDesk } from './use-import'

const SEPARATORS: Readonly<Record<string, string>> = { ';': 'semicolon', ',': 'comma', '\t': 'tab', '|': 'upright line' }
const ENCODINGS = {
  'utf-8': 'UTF-8',
  'utf-16le': 'UTF-16, little end first',
  'utf-16be': 'UTF-16, big end first',
  'windows-1252': 'Windows-1252 (Western Europe)',
} as const
const SURE = { sure: 'by its heading', likely: 'a guess: please look', unknown: 'not used' } as const

/** How the list was read: writing, headings, and what each column is, with three of its cells. Open by itself where something is not sure. */
export function ImportColumns({ desk, plan }: { readonly desk: ImportDesk; readonly plan: ImportAnswer }) {
  const [columns, setColumns] = useState(() => plan.columns.map(({ column }) => column))
  const twice = columns.filter((column, index) => column !== null && columns.indexOf(column) !== index)
  if (plan.columns.length === 0) return null
  const choose = (change: Partial<Choices>) => desk.say((before) => ({ ...before, choices: { ...before.choices, ...change } }))
  return (
    <details open={plan.columnsNeeded || undefined} className="border-2 p-4">
      <summary className="target flex flex-wrap items-center gap-x-3">
        <span className="heading text-2xl text-accent underline underline-offset-4">
          {plan.columnsNeeded ? 'Say what the columns are' : 'How the list was read'}
        </span>
        <span className="text-muted">
          {plan.encoding === null ? '' : ENCODINGS[plan.encoding]}, {SEPARATORS[plan.separator] ?? plan.separator}, headings in row{' '}
          {plan.headingRow}
        </span>
      </summary>
      {plan.columnsNeeded && (
        <p className="mt-2">
          Not every column says plainly what it is. Look at what was guessed, put it right and go on; nothing is read as certain before.
        </p>
      )}
      <div className="mt-4 grid items-end gap-4 sm:grid-cols-2">
        <SelectField
          label="Letters are written in"
          value={plan.encoding ?? 'utf-8'}
          onChange={({ target }) => choose({ encoding: target.value as keyof typeof ENCODINGS, columns: null })}
        >
          {Object.entries(ENCODINGS).map(([value, words]) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </SelectField>
        <TextField
          label="Headings stand in row"
          description="0 for a list without headings"
          inputMode="numeric"
          defaultValue={String(plan.headingRow)}
          onBlur={({ target }) => {
            const row = /^\d{1,5}$/.test(target.value.trim()) ? Number(target.value) : plan.headingRow
            if (row !== plan.headingRow) choose({ headingRow: row, columns: null })
          }}
        />
      </div>
      <DataTable caption="Columns" className="mt-4">
        <thead>
          <tr>
            <Th>Heading</Th>
            <Th>It is the</Th>
            <Th>How sure</Th>
            <Th>Three of its cells</Th>
          </tr>
        </thead>
        <tbody>
          {plan.columns.map(({ index, heading, sure, samples }) => (
            <tr key={index}>
              <Th scope="row">{heading === '' ? <span className="text-muted">no heading</span> : heading}</Th>
              <Td>
                <select
                  aria-label={`Column ${index + 1}, ${heading === '' ? 'no heading' : heading}, is the`}
                  className="min-h-12 rounded-sm border-2 border-line bg-ground px-2"
                  value={columns[index] ?? ''}
                  onChange={({ target }) => setColumns(columns.map((column, at) => (at === index ? asColumn(target.value) : column)))}
                >
                  <option value="">not used</option>
                  {ENTRY_COLUMNS.map((column) => (
                    <option key={column} value={column}>
                      {COLUMN_NAMES[column]}
                    </option>
                  ))}
                </select>
              </Td>
              <Td className={sure === 'likely' ? 'font-bold' : ''}>{SURE[sure]}</Td>
              <Td className="max-w-80 break-words">
                {samples.length === 0 ? <span className="text-muted">empty</span> : samples.join(' · ')}
              </Td>
            </tr>
          ))}
        </tbody>
      </DataTable>
      {twice.length > 0 && (
        <p role="alert" className="mt-3 font-bold">
          Two columns are the {twice.map((column) => (column === null ? '' : COLUMN_NAMES[column])).join(' and the ')}. Leave one of them.
        </p>
      )}
      <div className="mt-4">
        <Button
          look={plan.columnsNeeded ? 'primary' : 'secondary'}
          disabled={twice.length > 0}
          onClick={() => {
            const choices = { ...desk.said.choices, columns }
            desk.say((before) => ({ ...before, choices }))
            if (desk.stage.at === 'looked') void desk.look(desk.stage.list, { ...desk.said, choices }, plan)
          }}
        >
          Read it with these columns
        </Button>
      </div>
    </details>
  )
}

function asColumn(value: string): EntryColumn | null {
  return ENTRY_COLUMNS.find((column) => column === value) ?? null
}
