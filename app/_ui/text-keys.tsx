'use client'

import { useId } from 'react'
import { Key } from './keypad'

export interface TextKeysProps {
  /** What is typed: “Date code on the sidewall”. */
  readonly label: string
  readonly value: string
  readonly onChange: (value: string) => void
  /** The keys, in the order in which they stand. */
  readonly keys: readonly string[]
  readonly maxLength: number
  /** What is expected: “week and year, such as 1419”. */
  readonly description?: string
  /** What it means as read so far: “week 14 of 2019, 7 years old”. */
  readonly judgement?: string
}

/** The figures, for date codes on tyres and labels. */
export const FIGURE_KEYS: readonly string[] = ['1', '2', '3', '4', '5', '6', '7', '8', '9', '0']

/** Letters and figures that are not mistaken for one another, for codes typed from a sticker. */
export const CODE_KEYS: readonly string[] = Array.from('0123456789ABCDEFGHJKMNPQRSTVWXYZ')

/** Keys for a short code, for gloves; a keyboard types into the same value. */
export function TextKeys({ label, value, onChange, keys, maxLength, description, judgement }: TextKeysProps) {
  const id = useId()
  // Ten keys or fewer stand as on a number pad.
  const isPad = keys.length <= 10
  const take = (text: string) =>
    onChange(
      Array.from(text.toUpperCase())
        .filter((char) => keys.includes(char))
        .join('')
        .slice(0, maxLength),
    )
  return (
    <div data-slot="text-keys" className="grid gap-3">
      <label htmlFor={id} className="font-bold">
        {label}
      </label>
      {description !== undefined && (
        <p id={`${id}-description`} className="text-muted">
          {description}
        </p>
      )}
      <input
        id={id}
        inputMode="none"
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        aria-describedby={description === undefined ? `${id}-means` : `${id}-description ${id}-means`}
        value={value}
        onChange={({ target }) => take(target.value)}
        className="serial w-full border-b-[3px] bg-ground text-4xl tracking-widest"
      />
      <p id={`${id}-means`} aria-live="polite" className="min-h-6 font-bold">
        {judgement}
      </p>
      <div className={isPad ? 'grid grid-cols-3 gap-2' : 'grid grid-cols-[repeat(auto-fill,minmax(56px,1fr))] gap-2'}>
        {keys.map((key) => (
          <Key key={key} onPress={() => take(value + key)}>
            {key}
          </Key>
        ))}
        <Key onPress={() => onChange(value.slice(0, -1))} name="Take back the last character" className={isPad ? 'col-span-2' : ''}>
          ⌫
        </Key>
      </div>
    </div>
  )
}
