'use client'

import { useRef, useState } from 'react'
import { entryImport } from '@/lib/contracts/entry-import'
import { call, type Called } from '@/lib/http/call'
import { NOTHING_SAID, type ImportAnswer, type ImportStage, type Said } from './import-words'
import { readFile, type ChosenList } from './read-file'

export type ImportDesk = ReturnType<typeof useImport>

/** Reads a list, looks it through by a dry run at once and again with each answer, and imports exactly what the last dry run saw. */
export function useImport(eventId: string) {
  const [stage, setStage] = useState<ImportStage>({ at: 'nothing' })
  const [said, setSaid] = useState<Said>(NOTHING_SAID)
  /** Something was said since the last dry run: what is shown is not yet what would be imported. */
  const [isChanged, setChanged] = useState(false)
  const asked = useRef(0)

  function ask(list: ChosenList, what: Said, dryRun: boolean, planHash: string): Promise<Called<ImportAnswer>> {
    const { choices, answers } = what
    const body = { fileName: list.fileName.slice(0, 200), base64: list.base64, choices, answers: [...answers], dryRun, planHash }
    return call(entryImport, { params: { event: eventId }, body })
  }

  async function choose(file: File): Promise<void> {
    const mine = ++asked.current
    setStage({ at: 'reading', fileName: file.name, done: 0, total: file.size })
    const read = await readFile(file, (done) => {
      if (asked.current === mine) setStage({ at: 'reading', fileName: file.name, done, total: file.size })
    })
    if (asked.current !== mine) return
    setSaid(NOTHING_SAID)
    if ('why' in read) setStage({ at: 'unreadable', ...read })
    else await look(read, NOTHING_SAID, null)
  }

  async function look(list: ChosenList, what: Said, before: ImportAnswer | null): Promise<void> {
    const mine = ++asked.current
    setStage({ at: 'looking', list, plan: before })
    const looked = await ask(list, what, true, '')
    // Another file was chosen meanwhile: its answer counts, not this one.
    if (asked.current !== mine) return
    setChanged(false)
    if (looked.ok) setStage({ at: 'looked', list, plan: looked.value, problem: null })
    else if (before !== null) setStage({ at: 'looked', list, plan: before, problem: looked.problem })
    else setStage({ at: 'refused', list, problem: looked.problem })
  }

  async function commit(list: ChosenList, plan: ImportAnswer): Promise<void> {
    setStage({ at: 'importing', list, plan })
    const done = await ask(list, said, false, plan.planHash)
    setStage(done.ok ? { at: 'done', list, answer: done.value } : { at: 'looked', list, plan, problem: done.problem })
  }

  function say(change: (before: Said) => Said): void {
    setSaid(change)
    setChanged(true)
  }

  const again = () => {
    if (stage.at === 'looked') void look(stage.list, said, stage.plan)
    if (stage.at === 'refused') void look(stage.list, said, null)
  }
  return { stage, said, isChanged, choose, look, commit, say, again }
}
