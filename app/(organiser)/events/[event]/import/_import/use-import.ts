'use client'

import { useRef, useState } from 'react'
import type { AnswerOf } from '@/lib/contracts/contract'
import { entryImport } from '@/lib/contracts/entry-import'
import type { Problem } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'

export type ImportAnswer = AnswerOf<typeof entryImport>

/** The list that was chosen, as the browser read it. */
export interface ChosenList {
  readonly fileName: string
  readonly bytes: number
  readonly text: string
}

/** Where an import is. */
export type ImportStage =
  | { readonly at: 'nothing' }
  | { readonly at: 'unreadable'; readonly fileName: string; readonly why: string; readonly todo: string }
  | { readonly at: 'looking'; readonly list: ChosenList }
  | { readonly at: 'looked'; readonly list: ChosenList; readonly plan: ImportAnswer; readonly problem: Problem | null }
  | { readonly at: 'refused'; readonly list: ChosenList; readonly problem: Problem }
  | { readonly at: 'importing'; readonly list: ChosenList; readonly plan: ImportAnswer }
  | { readonly at: 'done'; readonly list: ChosenList; readonly answer: ImportAnswer }

/** Room left beside the text itself for what JSON adds to it. */
const LARGEST_BYTES = Math.floor(entryImport.limitBytes * 0.9)

/** Reads a list, looks it through by a dry run at once, and imports exactly what the dry run saw. */
export function useImport(eventId: string) {
  const [stage, setStage] = useState<ImportStage>({ at: 'nothing' })
  const asked = useRef(0)
  const ask = (list: ChosenList, dryRun: boolean, planHash: string) =>
    call(entryImport, { params: { event: eventId }, body: { fileName: list.fileName.slice(0, 200), text: list.text, dryRun, planHash } })

  async function choose(file: File): Promise<void> {
    const mine = ++asked.current
    const read = await readList(file)
    if (asked.current !== mine) return
    if ('why' in read) setStage({ at: 'unreadable', ...read })
    else await look(read)
  }

  async function look(list: ChosenList): Promise<void> {
    const mine = ++asked.current
    setStage({ at: 'looking', list })
    const looked = await ask(list, true, '')
    // Another file was chosen meanwhile: its answer counts, not this one.
    if (asked.current !== mine) return
    setStage(looked.ok ? { at: 'looked', list, plan: looked.value, problem: null } : { at: 'refused', list, problem: looked.problem })
  }

  async function commit(list: ChosenList, plan: ImportAnswer): Promise<void> {
    setStage({ at: 'importing', list, plan })
    const done = await ask(list, false, plan.planHash)
    setStage(done.ok ? { at: 'done', list, answer: done.value } : { at: 'looked', list, plan, problem: done.problem })
  }

  return { stage, choose, look, commit, begin: () => setStage({ at: 'nothing' }) }
}

async function readList(file: File): Promise<ChosenList | { readonly fileName: string; readonly why: string; readonly todo: string }> {
  const { name: fileName, size: bytes } = file
  if (bytes > LARGEST_BYTES)
    return {
      fileName,
      why: `The file has ${sizeInWords(bytes)}; ${sizeInWords(LARGEST_BYTES)} is the most.`,
      todo: 'Split the list and import the parts.',
    }
  const text = decode(await file.arrayBuffer())
  if (text === null)
    return { fileName, why: 'This is not a text file.', todo: 'Save the list as CSV (UTF-8) in your spreadsheet and choose that file.' }
  return { fileName, bytes, text }
}

/** UTF-8 or, by its mark, UTF-16; a spreadsheet's own format holds null bytes and is no text. Anything else is read as Windows-1252. */
function decode(buffer: ArrayBuffer): string | null {
  const bytes = new Uint8Array(buffer)
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le').decode(bytes)
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be').decode(bytes)
  if (bytes.includes(0)) return null
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  } catch (error) {
    if (error instanceof TypeError) return new TextDecoder('windows-1252').decode(bytes)
    throw error
  }
}

/** `412 bytes`, `14 KB`, `2.1 MB`. */
export function sizeInWords(bytes: number): string {
  if (bytes < 1_000) return `${bytes} bytes`
  return bytes < 1_000_000 ? `${Math.round(bytes / 1_000)} KB` : `${(bytes / 1_000_000).toFixed(1)} MB`
}
