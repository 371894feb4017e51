'use client'

import Link from 'next/link'
import { Button, buttonClass } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { Notice } from '@/app/_ui/notice'
import { ChooseFile } from './choose-file'
import { ImportPlan } from './import-plan'
import { type ImportStage, sizeInWords, useImport } from './use-import'

/** Choose a list, see what it would do, import it. Nothing is written before the last press. */
export function ImportScreen({ eventId }: { readonly eventId: string }) {
  const { stage, choose, look, commit } = useImport(eventId)
  return (
    <div className="grid max-w-[960px] gap-6">
      <ChooseFile isAnother={stage.at !== 'nothing'} onChoose={(file) => void choose(file)} />
      <p role="status" className={stage.at === 'looking' || stage.at === 'importing' ? '' : 'sr-only'}>
        {announcement(stage)}
      </p>
      {stage.at === 'nothing' && (
        <EmptyState title="No list chosen">
          A CSV file with a line of headings. It must name the entry number, surname, car, plate and run group; first name, e-mail, mobile,
          colour, passengers and notes are taken where they stand. You see what would happen before anything is written.
        </EmptyState>
      )}
      {stage.at === 'unreadable' && (
        <Notice happened={`${stage.fileName} cannot be read. ${stage.why}`} kept="Nothing was imported." todo={stage.todo} />
      )}
      {stage.at === 'refused' && (
        <Notice
          happened={stage.problem.what}
          kept="Nothing was imported."
          todo={stage.problem.todo}
          actions={<Button onClick={() => void look(stage.list)}>Look it through again</Button>}
        />
      )}
      {(stage.at === 'looked' || stage.at === 'importing') && (
        <>
          {stage.at === 'looked' && stage.problem !== null && (
            <Notice
              happened={stage.problem.what}
              kept={stage.problem.kept}
              todo={stage.problem.todo}
              actions={<Button onClick={() => void look(stage.list)}>Look it through again</Button>}
            />
          )}
          <ImportPlan
            list={stage.list}
            plan={stage.plan}
            isBusy={stage.at === 'importing'}
            onCommit={() => void commit(stage.list, stage.plan)}
          />
        </>
      )}
      {stage.at === 'done' && <Done eventId={eventId} stage={stage} />}
    </div>
  )
}

function Done({ eventId, stage: { list, answer } }: { readonly eventId: string; readonly stage: Extract<ImportStage, { at: 'done' }> }) {
  const { added, changed, unchanged } = answer
  return (
    <Notice
      weight="news"
      happened={`${list.fileName} is imported: ${entries(added)} added, ${changed} changed, ${unchanged} as they were.`}
      kept="Importing the same list again changes nothing."
      todo="Crew devices get the entries with their next pull."
      actions={
        <>
          <Link className={buttonClass('primary')} href={`/events/${eventId}/entries`}>
            See the entries
          </Link>
          <Link className={buttonClass('secondary')} href={`/events/${eventId}/board`}>
            To the board
          </Link>
        </>
      }
    />
  )
}

function announcement(stage: ImportStage): string {
  switch (stage.at) {
    case 'looking':
      return `Looking through ${stage.list.fileName}, ${sizeInWords(stage.list.bytes)}`
    case 'looked':
      return stage.plan.problemCount > 0
        ? `Looked through. ${stage.plan.problemCount} problems; nothing can be imported yet.`
        : `Looked through. ${entries(stage.plan.added)} would be added, ${stage.plan.changed} changed.`
    case 'importing':
      return `Importing ${entries(stage.plan.added + stage.plan.changed)}`
    default:
      return ''
  }
}

export function entries(count: number): string {
  return count === 1 ? '1 entry' : `${count} entries`
}
