'use client'

import { useCallback, useEffect, useRef, useState } from 'react'
import type { BookCheck } from '@/lib/checklist/book'
import { saveDraft } from '@/lib/contracts/my-declaration'
import { call } from '@/lib/http/call'
import { type FormState, partsOfForm } from '@/app/(entrant)/_answers/form-state'
import { forgetForm, keepForm, keptForm } from './kept-form'

export type Saving =
  | { readonly state: 'saved'; readonly at: number | null }
  | { readonly state: 'waiting' }
  | { readonly state: 'failed'; readonly why: string; readonly isKeptHere: boolean }

/** Soon after the last key, so that half a declaration is never lost. */
const AFTER_MS = 800
const AGAIN_MS = 10_000

/** The form, saved on the server by itself after each change; while that fails, kept on this phone and tried again. */
export function useSavedDraft(entry: string, first: FormState, firstAt: number | null, checks: readonly BookCheck[]) {
  const [form, setForm] = useState(first)
  const [saving, setSaving] = useState<Saving>({ state: 'saved', at: firstAt })
  const isDirty = useRef(false)
  const latest = useRef(first)

  const save = useCallback(async () => {
    // Signed meanwhile: a draft that came after it would stand beside it as a change.
    if (!isDirty.current) return
    const sent = latest.current
    const answer = await call(saveDraft, { params: { entry }, body: { parts: partsOfForm(sent, checks) } })
    if (!answer.ok) {
      setSaving({ state: 'failed', why: answer.problem.what, isKeptHere: keepForm(entry, latest.current) })
      return
    }
    // What was typed while it was on its way is saved by the next round.
    if (latest.current !== sent) return
    isDirty.current = false
    forgetForm(entry)
    setSaving({ state: 'saved', at: answer.value.savedAt })
  }, [entry, checks])

  const change = useCallback((next: (before: FormState) => FormState) => {
    setForm((before) => {
      latest.current = next(before)
      return latest.current
    })
    isDirty.current = true
    setSaving({ state: 'waiting' })
  }, [])

  useEffect(() => {
    const kept = keptForm(entry)
    if (kept !== null) change(() => kept)
  }, [entry, change])

  const failed = saving.state === 'failed'
  useEffect(() => {
    if (!isDirty.current) return
    const timer = setTimeout(() => void save(), failed ? AGAIN_MS : AFTER_MS)
    return () => clearTimeout(timer)
  }, [form, saving, failed, save])

  /** Signed: nothing is left to save. */
  const done = useCallback(() => {
    isDirty.current = false
    forgetForm(entry)
  }, [entry])

  return { form, change, saving, done }
}
