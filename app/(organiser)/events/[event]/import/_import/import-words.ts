import type { CallInput, AnswerOf } from '@/lib/contracts/contract'
import type { entryImport } from '@/lib/contracts/entry-import'
import type { Problem } from '@/lib/contracts/problem'
import type { ChosenList } from './read-file'

export type ImportAnswer = AnswerOf<typeof entryImport>
type Body = CallInput<typeof entryImport>['body']
export type Choices = Body['choices']
export type ListAnswer = Body['answers'][number]

/** What the organiser has said about the list so far. */
export interface Said {
  readonly choices: Choices
  readonly answers: readonly ListAnswer[]
}

export const NOTHING_SAID: Said = {
  choices: { encoding: null, headingRow: null, columns: null, corrections: [], leftOut: [] },
  answers: [],
}

/** Where an import is. */
export type ImportStage =
  | { readonly at: 'nothing' }
  | { readonly at: 'reading'; readonly fileName: string; readonly done: number; readonly total: number }
  | { readonly at: 'unreadable'; readonly fileName: string; readonly why: string; readonly todo: string }
  | { readonly at: 'looking'; readonly list: ChosenList; readonly plan: ImportAnswer | null }
  | { readonly at: 'looked'; readonly list: ChosenList; readonly plan: ImportAnswer; readonly problem: Problem | null }
  | { readonly at: 'refused'; readonly list: ChosenList; readonly problem: Problem }
  | { readonly at: 'importing'; readonly list: ChosenList; readonly plan: ImportAnswer }
  | { readonly at: 'done'; readonly list: ChosenList; readonly answer: ImportAnswer }

export function entriesInWords(count: number): string {
  return count === 1 ? '1 entry' : `${count} entries`
}
