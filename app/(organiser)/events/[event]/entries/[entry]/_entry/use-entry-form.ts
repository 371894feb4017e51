'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useForm, type FieldPath } from 'react-hook-form'
import { editEntry, entryEdit, type EntryEdit } from '@/lib/contracts/entry-edit'
import type { Problem } from '@/lib/contracts/problem'
import type { EntryView } from '@/lib/entries/entry-view'
import { call } from '@/lib/http/call'

/** What came of the last save. */
export type SaveState =
  | { readonly at: 'nothing' }
  | { readonly at: 'saved'; readonly fields: readonly string[]; readonly records: number }
  | { readonly at: 'problem'; readonly problem: Problem }

/** The entry's form. After somebody else's change what was typed stays, and what they changed stands beside it. */
export function useEntryForm(view: EntryView) {
  const router = useRouter()
  const [state, setState] = useState<SaveState>({ at: 'nothing' })
  const form = useForm<EntryEdit>({ resolver: zodResolver(entryEdit), defaultValues: copyOf(view.values), mode: 'onBlur' })
  /** Fields that another person changed while this one typed. */
  const [meanwhile, setMeanwhile] = useState<readonly string[]>([])

  const save = form.handleSubmit(async (edit) => {
    const saved = await call(editEntry, { params: { event: view.eventId, entry: view.id }, body: { version: view.version, edit } })
    if (saved.ok) {
      setState({ at: 'saved', fields: saved.value.fields, records: saved.value.records })
      setMeanwhile([])
      form.reset(edit)
      router.refresh()
      return
    }
    const { problem } = saved
    setState({ at: 'problem', problem })
    if (problem.code === 'entry-edited-meanwhile') {
      setMeanwhile(problem.issues.map(({ path }) => path))
      // Brings the entry as it is now; what was typed is the form's own and stays.
      router.refresh()
      return
    }
    for (const { path, message } of problem.issues) form.setError(path.replace(/^edit\./, '') as FieldPath<EntryEdit>, { message })
  })

  /** Takes the entry as it is now, and lets go of what was typed. */
  function takeTheirs(): void {
    form.reset(copyOf(view.values))
    setState({ at: 'nothing' })
    setMeanwhile([])
  }
  return { form, state, meanwhile, save, takeTheirs }
}

function copyOf(values: EntryView['values']): EntryEdit {
  return { ...values, facts: { ...values.facts }, people: values.people.map((one) => ({ ...one })) }
}
