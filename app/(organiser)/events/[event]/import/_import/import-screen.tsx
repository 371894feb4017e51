'use client'

import Link from 'next/link'
import { Button, buttonClass } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { Notice } from '@/app/_ui/notice'
import { Progress } from '@/app/_ui/progress'
import { ChooseFile } from './choose-file'
import { ImportPlan } from './import-plan'
import { entriesInWords, type ImportStage } from './import-words'
import { sizeInWords } from './read-file'
import { useImport } from './use-import'

/** Choose a list, say what only you know about it, see what it would do, import it. Nothing is written before the last press. */
export function ImportScreen({ eventId }: { readonly eventId: string }) {
  const desk = useImport(eventId)
  const { stage } = desk
  const lookAgain = <Button onClick={desk.again}>Look it through again</Button>
  return (
    <div className="grid max-w-[1080px] gap-6">
      <ChooseFile isAnother={stage.at !== 'nothing'} onChoose={(file) => void desk.choose(file)} />
      <p role="status" className={stage.at === 'looking' || stage.at === 'importing' ? '' : 'sr-only'}>
        {announcement(stage)}
      </p>
      {stage.at === 'nothing' && (
        <EmptyState title="No list chosen">
          A CSV file as your spreadsheet saves it: comma, semicolon or tab, in any writing. It must name the entry number, the driver, the
          car, the plate and the run group; e-mail, mobile, colour, passengers, role, second driver, team and notes are taken where they
          stand. What is not sure is asked, and you see what would happen before anything is written.
        </EmptyState>
      )}
      {stage.at === 'reading' && (
        <Progress
          label={`Reading ${stage.fileName}`}
          done={Math.round(stage.done / 1_000)}
          total={Math.round(stage.total / 1_000)}
          unit="KB"
        />
      )}
      {stage.at === 'unreadable' && (
        <Notice happened={`${stage.fileName} cannot be read. ${stage.why}`} kept="Nothing was imported." todo={stage.todo} />
      )}
      {stage.at === 'refused' && (
        <Notice happened={stage.problem.what} kept="Nothing was imported." todo={stage.problem.todo} actions={lookAgain} />
      )}
      {stage.at === 'looked' && stage.problem !== null && (
        <Notice
          happened={stage.problem.what}
          kept={`${stage.problem.kept} What you answered is still here.`}
          todo={stage.problem.todo}
          actions={lookAgain}
        />
      )}
      {(stage.at === 'looked' || stage.at === 'importing' || (stage.at === 'looking' && stage.plan !== null)) && stage.plan !== null && (
        <ImportPlan desk={desk} list={stage.list} plan={stage.plan} isBusy={stage.at !== 'looked'} />
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
      happened={`${list.fileName} is imported: ${entriesInWords(added)} added, ${changed} changed, ${unchanged} as they were.`}
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
      return lookedWords(stage.plan)
    case 'importing':
      return `Importing ${entriesInWords(stage.plan.added + stage.plan.changed)}`
    default:
      return ''
  }
}

function lookedWords({
  problemCount,
  openQuestions,
  columnsNeeded,
  added,
  changed,
}: Extract<ImportStage, { at: 'looked' }>['plan']): string {
  if (columnsNeeded) return 'Looked through. Say what the columns are.'
  if (problemCount > 0 || openQuestions > 0)
    return `Looked through. ${problemCount} problems and ${openQuestions} open questions; nothing can be imported yet.`
  return `Looked through. ${entriesInWords(added)} would be added, ${changed} changed.`
}
