'use client'

import { useDay } from '@/app/_crew/day-context'
import { declaredKey } from '@/lib/checklist/declarable'
import type { BookCheck } from '@/lib/checklist/book'
import type { WalkSubject } from './use-walk'
import { declaredWords } from './declared-words'

interface DeclaredHereProps {
  readonly subject: WalkSubject
  readonly check: BookCheck
}

/** What the entrant declared of this check, beside what is looked at. Never filled in as an answer: whoever looks writes down what they see. */
export function DeclaredHere({ subject, check }: DeclaredHereProps) {
  const day = useDay()
  const values =
    'car' in subject
      ? day.entry(subject.car)?.declared[declaredKey(check.id, null)]
      : day.entries().find(({ declared }) => declaredKey(check.id, subject.person) in declared)?.declared[
          declaredKey(check.id, subject.person)
        ]
  const words = values ? declaredWords(values, check) : ''
  if (words === '') return null
  return (
    <p className="mt-3 border-l-4 border-line pl-3">
      <span className="text-muted">Declared: </span>
      <span className="serial">{words}</span>
    </p>
  )
}
