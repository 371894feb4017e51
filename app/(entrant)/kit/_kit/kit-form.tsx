'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { PhotoField } from '@/app/_photos/photo-field'
import { Button } from '@/app/_ui/button'
import { TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import type { BookCheck } from '@/lib/checklist/book'
import { preCheck } from '@/lib/checklist/pre-check'
import { addKit, keepKit, kitBody, type KitKind } from '@/lib/contracts/my-garage'
import { kitCheck, kitFields } from '@/lib/entrants/kit-fields'
import type { MyKit } from '@/lib/entrants/queries/my-garage'
import { call } from '@/lib/http/call'
import { civilDate } from '@/lib/rules/civil-date'
import { readValues } from '@/lib/walk/read-values'
import { AnswerFields } from '../../_answers/answer-fields'
import { PreCheckLine } from '../../_answers/pre-check-line'
import { typedOf } from '../../_answers/typed-of'
import { KIT_WORDS } from './kit-line'

interface KitFormProps {
  /** Null for a new one. */
  readonly piece: MyKit | null
  readonly kind: KitKind
  readonly checks: readonly BookCheck[]
  readonly lastDay: string | null
  readonly onClose: () => void
}

/** One piece of kit: its name, its label judged at each key, and a photograph of it. */
export function KitForm({ piece, kind, checks, lastDay, onClose }: KitFormProps) {
  const router = useRouter()
  const check = kitCheck(kind, checks)
  const fields = kitFields(check)
  const [name, setName] = useState(piece?.name ?? '')
  const [typed, setTyped] = useState(typedOf(piece?.values ?? {}))
  const [photoHash, setPhoto] = useState(piece?.photoHash ?? null)
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState<{ readonly what: string; readonly todo?: string } | null>(null)
  const { values, problems } = readValues(fields, typed)

  const save = async (retired: boolean) => {
    const body = kitBody.safeParse({ kind, name, values, photoHash, retired })
    if (!body.success) {
      setProblem({ what: body.error.issues[0]?.message ?? 'Something is missing.' })
      return
    }
    setBusy(true)
    const answer = piece ? await call(keepKit, { params: { kit: piece.id }, body: body.data }) : await call(addKit, { body: body.data })
    setBusy(false)
    if (!answer.ok) {
      setProblem(answer.problem)
      return
    }
    onClose()
    router.refresh()
  }

  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault()
        void save(false)
      }}
      noValidate
    >
      <h2 className="text-lg">{KIT_WORDS[kind]}</h2>
      {problem && <Notice happened={problem.what} kept="What you typed is still here." todo={problem.todo} />}
      <TextField
        label="Name"
        description="By which you know it: white full face."
        autoComplete="off"
        value={name}
        onChange={({ target }) => setName(target.value)}
      />
      <AnswerFields name={`kit ${kind}`} fields={fields} typed={typed} problems={problems} onTyped={setTyped} />
      {check && lastDay !== null && (
        <PreCheckLine
          check={check}
          {...preCheck(check, values, {}, civilDate(lastDay))}
          isEmpty={problems.length > 0 || Object.keys(values).length === 0}
        />
      )}
      <PhotoField label="The label itself" value={photoHash} onChange={setPhoto} />
      <div className="flex flex-wrap gap-3">
        <Button type="submit" isBusy={busy}>
          Keep it
        </Button>
        {piece && (
          <Button look="secondary" isBusy={busy} onClick={() => void save(!piece.retired)}>
            {piece.retired ? 'Use it again' : 'Put it away'}
          </Button>
        )}
        <Button look="quiet" onClick={onClose}>
          Leave it as it was
        </Button>
      </div>
    </form>
  )
}
