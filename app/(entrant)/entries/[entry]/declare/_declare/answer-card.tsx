'use client'

import { PhotoField } from '@/app/_photos/photo-field'
import { Button } from '@/app/_ui/button'
import { fieldsAtHome } from '@/lib/checklist/declarable'
import type { DeclaredItem } from '@/lib/entrants/declared-items'
import { readValues, type Typed } from '@/lib/walk/read-values'
import { AnswerFields } from '@/app/(entrant)/_answers/answer-fields'
import { fieldsAsked } from '@/lib/entrants/fields-asked'
import { Sources } from '@/app/(entrant)/_answers/sources'
import { PreCheckLine } from '@/app/(entrant)/_answers/pre-check-line'
import type { AnswerGroup } from './answer-groups'
import type { FormState } from '@/app/(entrant)/_answers/form-state'

interface AnswerCardProps {
  readonly group: AnswerGroup
  readonly form: FormState
  readonly placeOf: (place: string) => string
  readonly onTyped: (key: string, typed: Typed) => void
  readonly onPhotos: (key: string, hashes: readonly string[]) => void
}

/** One question: what is seen when it is right, how to look, the values, and what the bay’s rule makes of them at each key. */
export function AnswerCard({ group, form, placeOf, onTyped, onPhotos }: AnswerCardProps) {
  const [first] = group.items
  const isSeveral = group.items.length > 1
  return (
    <section aria-label={first.check.prompt} className="grid gap-4 border-t-[1.5px] py-5">
      <div>
        <h3 className="text-lg">{first.check.prompt}</h3>
        <p className="mt-1 text-muted">{first.check.how}</p>
      </div>
      {group.items.map((item) => (
        <div
          key={item.key}
          role="group"
          aria-label={placeOf(item.check.place)}
          className={isSeveral ? 'grid gap-3 border-l-4 pl-3' : 'grid gap-3'}
        >
          {isSeveral && <h4 className="heading text-lg">{placeOf(item.check.place)}</h4>}
          <Answer item={item} typed={form.typed[item.key] ?? {}} onTyped={onTyped} hidesSource={isSeveral} />
          {item === first && isSeveral && <SameOnAll group={group} form={form} onTyped={onTyped} />}
        </div>
      ))}
      {isSeveral && first.kind === 'label' && <Sources source={first.check.source ?? []} />}
      {hasLabel(first) && (
        <PhotoField
          label="The label itself"
          description="If you can: the bay sees it beside what you declared."
          value={form.photos[first.key]?.[0] ?? null}
          onChange={(hash) => onPhotos(first.key, hash === null ? [] : [hash])}
        />
      )}
    </section>
  )
}

interface AnswerProps extends Pick<AnswerCardProps, 'onTyped'> {
  readonly item: DeclaredItem
  readonly typed: Typed
  readonly hidesSource: boolean
}

function Answer({ item, typed, onTyped, hidesSource }: AnswerProps) {
  const fields = fieldsAsked(item.check, typed)
  const { problems } = readValues(fields, typed)
  const isEmpty = Object.values(typed).every((text) => text.trim() === '')
  return (
    <>
      <AnswerFields name={item.key} fields={fields} typed={typed} problems={problems} onTyped={(next) => onTyped(item.key, next)} />
      <PreCheckLine
        check={item.check}
        preCheck={item.preCheck}
        judgement={item.judgement}
        isEmpty={isEmpty || problems.length > 0}
        hidesSource={hidesSource}
      />
    </>
  )
}

/** Sets of tyres are often of one week: typed once, it is offered for the corners that are still empty. Never a measurement. */
function SameOnAll({ group, form, onTyped }: Pick<AnswerCardProps, 'group' | 'form' | 'onTyped'>) {
  const [first, ...rest] = group.items
  const typed = form.typed[first.key] ?? {}
  const empty = rest.filter(({ key }) => Object.values(form.typed[key] ?? {}).every((text) => text === ''))
  const isText = fieldsAtHome(first.check).every(({ kind }) => kind === 'text')
  if (!isText || empty.length === 0 || Object.values(typed).every((text) => text.trim() === '')) return null
  return (
    <Button look="secondary" className="justify-self-start" onClick={() => empty.forEach(({ key }) => onTyped(key, typed))}>
      The same on the other {empty.length === 1 ? 'one' : empty.length}
    </Button>
  )
}

/** Standing labels are worth a photograph; a tyre’s week or tread is not. */
function hasLabel({ kind, check }: DeclaredItem): boolean {
  return kind === 'label' && (check.standing || check.subject === 'person')
}
