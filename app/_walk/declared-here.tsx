'use client'

import { useDay } from '@/app/_crew/day-context'
import { KeptPhoto } from '@/app/_crew/kept-photo'
import type { BookCheck } from '@/lib/checklist/book'
import { declaredKey } from '@/lib/checklist/declarable'
import { declaredWords } from './declared-words'
import type { WalkSubject } from './use-walk'

interface DeclaredHereProps {
  readonly subject: WalkSubject
  readonly check: BookCheck
}

/** What the entrant declared of this check, beside what is looked at. Never filled in as an answer: whoever looks writes down what they see. */
export function DeclaredHere({ subject, check }: DeclaredHereProps) {
  const day = useDay()
  const key = declaredKey(check.id, 'car' in subject ? null : subject.person)
  const entry = 'car' in subject ? day.entry(subject.car) : day.entries().find(({ declared }) => key in declared)
  const words = declaredWords(entry?.declared[key] ?? {}, check)
  const photos = entry?.declaredPhotos[key] ?? []
  if (words === '' && photos.length === 0) return null
  return (
    <div className="mt-3 border-l-4 border-line pl-3">
      <p>
        <span className="text-muted">Declared: </span>
        <span className="font-bold">{words === '' ? 'a photograph' : words}</span>
      </p>
      {photos.length > 0 && (
        <div className="mt-2 flex flex-wrap gap-2">
          {photos.map((hash) => (
            <KeptPhoto key={hash} hash={hash} words={`${check.short}, as declared`} />
          ))}
        </div>
      )}
    </div>
  )
}
