import type { UseFormReturn } from 'react-hook-form'
import { Button } from '@/app/_ui/button'
import { SelectField, TextField } from '@/app/_ui/field'
import type { TimetableBlockBody } from '@/lib/contracts/events'
import { KIND_WORDS } from './kind-words'

interface LineEditorProps {
  readonly form: UseFormReturn<{ day: string; blocks: TimetableBlockBody[] }>
  readonly index: number
  readonly groups: readonly { readonly id: string; readonly name: string }[]
  readonly onRemove: () => void
}

/** One line of a day: when, what, whose, how loud. */
export function LineEditor({ form: { register, formState }, index, groups, onRemove }: LineEditorProps) {
  const errors = formState.errors.blocks?.[index]
  const name = `blocks.${index}` as const
  return (
    <li className="grid grid-cols-2 items-start gap-x-3 gap-y-2 border-t py-3 sm:grid-cols-[110px_110px_minmax(0,1fr)_minmax(0,1fr)_140px_auto]">
      <TextField label="From" placeholder="09:00" autoComplete="off" error={errors?.startsAt?.message} {...register(`${name}.startsAt`)} />
      <TextField label="To" placeholder="09:20" autoComplete="off" error={errors?.endsAt?.message} {...register(`${name}.endsAt`)} />
      <SelectField label="What" error={errors?.kind?.message} {...register(`${name}.kind`)}>
        {Object.entries(KIND_WORDS).map(([kind, words]) => (
          <option key={kind} value={kind}>
            {words}
          </option>
        ))}
      </SelectField>
      <SelectField
        label="Whose"
        error={errors?.group?.message}
        {...register(`${name}.group`, { setValueAs: (id: string | null) => (id === '' ? null : id) })}
      >
        <option value="">everybody</option>
        {groups.map((group) => (
          <option key={group.id} value={group.id}>
            {group.name}
          </option>
        ))}
      </SelectField>
      <TextField
        label="Noise, dB(A)"
        inputMode="decimal"
        autoComplete="off"
        error={errors?.noiseLimitDb?.message}
        {...register(`${name}.noiseLimitDb`, { setValueAs: (text: unknown) => (text === '' || text === null ? null : Number(text)) })}
      />
      <Button look="quiet" className="self-end" onClick={onRemove} aria-label={`Take out line ${String(index + 1)}`}>
        Take out
      </Button>
    </li>
  )
}
