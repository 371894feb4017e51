'use client'

import { type UseFormReturn, useFieldArray } from 'react-hook-form'
import { Button } from '@/app/_ui/button'
import { SelectField, TextField } from '@/app/_ui/field'
import { type EntryEdit, SEAT_ROLES } from '@/lib/contracts/entry-edit'
import type { EntryView } from '@/lib/entries/entry-view'

interface EntryPeopleProps {
  readonly form: UseFormReturn<EntryEdit>
  readonly view: EntryView
  readonly theirs: string | undefined
}

/** Who sits in the car. Somebody who is at the event already is chosen, not typed again: one person needs one band, whatever cars they drive. */
export function EntryPeople({ form, view, theirs }: EntryPeopleProps) {
  const { control, register, formState, getValues } = form
  const { fields, append, remove } = useFieldArray({ control, name: 'people' })
  const inCar = new Set(getValues('people').map(({ person }) => person))
  const others = view.others.filter(({ id }) => !inCar.has(id))
  return (
    <fieldset className="grid gap-4 border-2 p-4">
      <legend className="px-1 font-bold">People in the car</legend>
      {theirs !== undefined && <p className="text-muted">{theirs}</p>}
      {fields.length === 0 && <p>Nobody yet: the pit exit answers HOLD for a car without a named driver.</p>}
      <ul className="grid gap-4">
        {fields.map((field, index) => {
          const errors = formState.errors.people?.[index]
          const isKnown = field.person !== null
          return (
            <li key={field.id} className="grid items-start gap-3 border-b pb-4 sm:grid-cols-2">
              <TextField
                label="Name"
                autoComplete="off"
                {...register(`people.${index}.name`)}
                error={errors?.name?.message}
                readOnly={isKnown && !view.seesContacts}
              />
              <SelectField label="Is the" {...register(`people.${index}.role`)} error={errors?.role?.message}>
                {SEAT_ROLES.map((role) => (
                  <option key={role}>{role}</option>
                ))}
              </SelectField>
              {view.seesContacts && (
                <>
                  <TextField
                    label="E-mail"
                    isOptional
                    autoComplete="off"
                    {...register(`people.${index}.email`)}
                    error={errors?.email?.message}
                  />
                  <TextField
                    label="Mobile"
                    isOptional
                    autoComplete="off"
                    {...register(`people.${index}.mobile`)}
                    error={errors?.mobile?.message}
                  />
                </>
              )}
              <div>
                <Button
                  look="secondary"
                  onClick={() => remove(index)}
                  aria-label={`Take out ${field.name === '' ? 'this person' : field.name}`}
                >
                  Take out
                </Button>
              </div>
            </li>
          )
        })}
      </ul>
      <div className="flex flex-wrap items-end gap-3">
        <Button look="secondary" onClick={() => append({ person: null, role: 'driver', name: '', email: '', mobile: '' })}>
          Add somebody new
        </Button>
        {others.length > 0 && (
          <div className="grow sm:max-w-72">
            <SelectField
              label="Add somebody of this event"
              value=""
              onChange={({ target }) => {
                const known = others.find(({ id }) => id === target.value)
                if (known) append({ person: known.id, role: 'driver', name: known.name, email: '', mobile: '' })
              }}
            >
              <option value="">choose</option>
              {others.map(({ id, name }) => (
                <option key={id} value={id}>
                  {name}
                </option>
              ))}
            </SelectField>
          </div>
        )}
      </div>
    </fieldset>
  )
}
