'use client'

import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import { SelectField, TextAreaField, TextField } from '@/app/_ui/field'
import { Notice } from '@/app/_ui/notice'
import { EDIT_WORDS, type EditField } from '@/lib/entries/entry-changes'
import type { EntryView } from '@/lib/entries/entry-view'
import { EntryPeople } from './entry-people'
import { useEntryForm } from './use-entry-form'

/** The office's form of an entry. Saving says what it does to passes before anybody finds out at the pit exit. */
export function EntryForm({ view }: { readonly view: EntryView }) {
  const { form, state, meanwhile, save, takeTheirs } = useEntryForm(view)
  const { register, formState, watch } = form
  const { errors, isSubmitting, isDirty } = formState
  const theirs = (field: EditField, value: string) => (meanwhile.includes(field) ? `Now: ${value === '' ? 'empty' : value}` : undefined)
  const group = (id: string) => view.groups.find((one) => one.id === id)?.name ?? 'no group'
  return (
    <form noValidate className="grid gap-4" onSubmit={(event) => void save(event)} aria-labelledby="entry-form">
      <h3 id="entry-form" className="text-2xl">
        The entry
      </h3>
      {view.hasRecords && (
        <p>
          This car has been looked at: number, plate, run group, people, car and its facts, withdrawn and returned are signed into the day’s
          log. A pass that does not know a new number, plate, car or fact dies.
        </p>
      )}
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField
          label="Number"
          autoComplete="off"
          {...register('number')}
          error={errors.number?.message}
          description={theirs('number', view.values.number)}
        />
        <TextField
          label="Plate"
          autoComplete="off"
          {...register('plate')}
          error={errors.plate?.message}
          description={theirs('plate', view.values.plate)}
        />
        <TextField
          label="Car"
          autoComplete="off"
          {...register('model')}
          error={errors.model?.message}
          description={theirs('model', view.values.model)}
        />
        <TextField
          label="Colour"
          autoComplete="off"
          {...register('colour')}
          error={errors.colour?.message}
          description={theirs('colour', view.values.colour)}
        />
        <SelectField
          label="Run group"
          {...register('group')}
          error={errors.group?.message}
          description={theirs('group', group(view.values.group))}
        >
          {view.groups.map(({ id, name }) => (
            <option key={id} value={id}>
              {name}
            </option>
          ))}
        </SelectField>
        <TextField
          label="Passenger seats"
          inputMode="numeric"
          {...register('passengerSeats', { setValueAs: asCount })}
          error={errors.passengerSeats?.message}
          description={theirs('passengerSeats', String(view.values.passengerSeats))}
        />
      </div>
      <TextAreaField label="Note" {...register('note')} error={errors.note?.message} description={theirs('note', view.values.note)} />
      <EntryPeople
        form={form}
        view={view}
        theirs={theirs('people', view.values.people.map(({ name, role }) => `${name} (${role})`).join(', '))}
      />
      {view.facts.length > 0 && (
        <fieldset className="border-2 p-4">
          <legend className="px-1 font-bold">Car facts</legend>
          <div className="grid gap-4 sm:grid-cols-2">
            {view.facts.map(({ name, label, values }) => (
              <SelectField
                key={name}
                label={label}
                {...register(`facts.${name}`, {
                  setValueAs: (said) => values.find(({ value }) => String(value) === String(said))?.value ?? null,
                })}
              >
                <option value="">not known</option>
                {values.map(({ value, label: words }) => (
                  <option key={String(value)} value={String(value)}>
                    {words}
                  </option>
                ))}
              </SelectField>
            ))}
          </div>
        </fieldset>
      )}
      <Choice {...register('withdrawn')}>
        {view.values.withdrawn && !watch('withdrawn') ? 'Withdrawn (will be returned)' : 'Withdrawn'}
      </Choice>
      {state.at === 'problem' && (
        <Notice
          happened={state.problem.what}
          kept={state.problem.kept}
          todo={state.problem.todo}
          actions={
            meanwhile.length > 0 ? (
              <Button look="secondary" onClick={takeTheirs}>
                Take theirs instead
              </Button>
            ) : undefined
          }
        />
      )}
      {state.at === 'saved' && !isDirty && <Notice weight="news" happened={savedWords(state.fields, state.records)} />}
      <div>
        <Button type="submit" isBusy={isSubmitting}>
          {meanwhile.length > 0 ? 'Save mine over it' : 'Save'}
        </Button>
      </div>
    </form>
  )
}

/** What was typed as a number; anything else is left for the schema to name. */
function asCount(said: unknown): unknown {
  return typeof said === 'string' && /^\s*\d+\s*$/.test(said) ? Number(said) : said
}

function savedWords(fields: readonly string[], records: number): string {
  if (fields.length === 0) return 'Nothing was changed: the entry is as it was.'
  const what = fields.map((field) => EDIT_WORDS[field as EditField]).join(', ')
  const signed = records === 0 ? '' : records === 1 ? ' One record stands in the day’s log.' : ` ${records} records stand in the day’s log.`
  return `Saved: ${what}.${signed} Crew devices get it with their next pull.`
}
