'use client'

import { useMemo } from 'react'
import { clockTime, dayWords } from '@/app/_crew/say-when'
import { NumberPlate } from '@/app/_ui/number-plate'
import { declaredItems, type DeclaredItem } from '@/lib/entrants/declared-items'
import type { Declaring } from '@/lib/entrants/queries/declaring-of'
import { civilDate } from '@/lib/rules/civil-date'
import { venueDay } from '@/lib/rules/venue-day'
import type { Typed } from '@/lib/walk/read-values'
import { FactFields } from '@/app/(entrant)/_answers/fact-fields'
import { AnswerCard } from './answer-card'
import { answerGroups } from './answer-groups'
import { ChangesSection } from './changes-section'
import { formOf, partsOfForm } from '@/app/(entrant)/_answers/form-state'
import { FromKit } from './from-kit'
import { SavingLine } from './saving-line'
import { SignSection } from './sign-section'
import { SumSection } from './sum-section'
import { useSavedDraft } from './use-saved-draft'

/** The declaration of one entry: what the car is, then only what applies to it, then the kit, judged at each key; saved by itself, signed at the end. */
export function DeclareScreen({ declaring }: { readonly declaring: Declaring }) {
  const { entry, event, facts, checks, people, before, signed } = declaring
  const first = useMemo(() => formOf(declaring.start), [declaring])
  const { form, change, saving, done } = useSavedDraft(entry.id, first, declaring.draftAt, checks)
  const parts = useMemo(() => partsOfForm(form, checks), [form, checks])
  const items = useMemo(() => declaredItems(checks, parts, people.map(({ id }) => id), civilDate(event.lastDay)), [checks, parts, people, event]) // prettier-ignore
  const onTyped = (key: string, typed: Typed) => change((now) => ({ ...now, typed: { ...now.typed, [key]: typed } }))
  const onPhotos = (key: string, hashes: readonly string[]) => change((now) => ({ ...now, photos: { ...now.photos, [key]: [...hashes] } }))
  const placeOf = (place: string) => declaring.places.find(({ id }) => id === place)?.title ?? place
  const card = { form, placeOf, onTyped, onPhotos }
  const of = (list: readonly DeclaredItem[], kind: DeclaredItem['kind']) => answerGroups(list.filter((item) => item.kind === kind))
  const ofCar = items.filter(({ person }) => person === null)
  const statements = of(items, 'statement')

  return (
    <div className="grid gap-6">
      <header className="flex flex-wrap items-end gap-x-5 gap-y-2">
        <NumberPlate number={entry.number} />
        <p>
          <strong className="text-lg">{entry.model}</strong>
          <span className="block">
            {entry.colour} · <span className="serial">{entry.plate}</span>
          </span>
        </p>
      </header>
      <Intro declaring={declaring} />
      <SavingLine saving={saving} timeZone={event.timeZone} />
      <section aria-labelledby="car" className="grid gap-4 border-t-[3px] pt-5">
        <h2 id="car" className="text-2xl">
          The car
        </h2>
        <FactFields facts={facts} said={form.facts} onSaid={(said) => change((now) => ({ ...now, facts: said }))} />
      </section>
      <section aria-labelledby="labels" className="border-t-[3px] pt-5">
        <h2 id="labels" className="pb-3 text-2xl">
          Labels, dates and tyres
        </h2>
        {of(ofCar, 'label').map((group) => (
          <AnswerCard key={group.id} group={group} {...card} />
        ))}
      </section>
      {people.map(({ id, name }) => (
        <section key={id} aria-label={`Kit of ${name}`} className="border-t-[3px] pt-5">
          <h2 className="pb-3 text-2xl">Kit of {name}</h2>
          {of(
            items.filter(({ person }) => person === id),
            'label',
          ).map((group) => (
            <div key={group.id}>
              {group.items[0].check.rule?.name === 'helmet-standard' && (
                <FromKit
                  kit={declaring.kit.filter(({ kind }) => kind === 'helmet')}
                  onTyped={(typed) => onTyped(group.items[0].key, typed)}
                />
              )}
              <AnswerCard group={group} {...card} />
            </div>
          ))}
        </section>
      ))}
      {statements.length > 0 && (
        <details className="border-t-[3px] pt-3">
          <summary className="heading cursor-pointer py-3 text-2xl text-accent underline underline-offset-4">
            Worth a look before you travel ({statements.length})
          </summary>
          <p className="pb-3 text-muted">
            You need not answer these. The bay looks at all of them; a no here is a surprise less on the day.
          </p>
          {statements.map((group) => (
            <AnswerCard key={group.id} group={group} {...card} />
          ))}
        </details>
      )}
      <ChangesSection
        now={parts}
        before={signed?.parts ?? before}
        beforeWords={signed ? `in version ${String(signed.version)}` : 'last time'}
        isSigned={signed !== null}
        facts={facts}
        checks={checks}
        onChanges={(changes) => change((now) => ({ ...now, changes }))}
      />
      <section aria-labelledby="sign" className="grid gap-4 border-t-[3px] pt-5">
        <h2 id="sign" className="text-2xl">
          Sign
        </h2>
        <SumSection items={items} />
        <SignSection entry={entry.id} me={declaring.me} parts={parts} onSigned={done} />
      </section>
    </div>
  )
}

function Intro({ declaring: { from, signed, isPresented, event } }: { readonly declaring: Declaring }) {
  return (
    <div className="grid max-w-prose gap-2">
      <p>
        Each answer is judged at once by the bay’s own rules, on the event’s last day. <strong>Nothing is passed here.</strong>
      </p>
      {from === 'kept' && (
        <p className="border-l-4 border-accent pl-3">Filled in from what is kept with your car. Read the labels again all the same.</p>
      )}
      {signed && (
        <p className="border-l-4 border-accent pl-3">
          Version {signed.version} was signed {dayWords(venueDay(signed.signedAt, event.timeZone))},{' '}
          {clockTime(signed.signedAt, event.timeZone)}. What you sign now becomes version {signed.version + 1}; the earlier one stays as it
          is.
        </p>
      )}
      {isPresented && (
        <p className="border-l-4 border-accent pl-3">
          The bay has begun to look at this car. A new declaration is told there, and a pass that was issued may have to be issued again.
        </p>
      )}
    </div>
  )
}
