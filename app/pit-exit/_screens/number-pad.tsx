'use client'

import { useId } from 'react'
import { Button } from '@/app/_ui/button'
import { Key } from '@/app/_ui/keypad'

interface NumberPadProps {
  /** Letters that numbers of this event hold. */
  readonly letters: readonly string[]
  readonly value: string
  readonly onChange: (value: string) => void
  readonly onAsk: () => void
  /** Holds the car with this number; null while there is none or several. */
  readonly onHold: (() => void) | null
}

const LONGEST = 12
const ROWS = [
  ['1', '2', '3'],
  ['4', '5', '6'],
  ['7', '8', '9'],
] as const

/** Keys for the number of a car, for gloves; a keyboard types into the same value. */
export function NumberPad({ letters, value, onChange, onAsk, onHold }: NumberPadProps) {
  const id = useId()
  const take = (text: string) => onChange(text.toUpperCase().slice(0, LONGEST))
  const press = (key: string) => take(value + key)
  return (
    <form
      className="grid gap-2"
      onSubmit={(event) => {
        event.preventDefault()
        if (value.trim() !== '') onAsk()
      }}
    >
      <div className="grid grid-cols-[1fr_auto] items-center gap-2">
        <label htmlFor={id} className="sr-only">
          Number of the car
        </label>
        <input
          id={id}
          inputMode="none"
          autoComplete="off"
          placeholder="number"
          value={value}
          onChange={({ target }) => take(target.value)}
          className="figures min-h-14 w-full min-w-0 border-b-[3px] bg-ground text-5xl placeholder:text-2xl placeholder:text-muted"
        />
        <Button look="secondary" disabled={onHold === null} onClick={onHold ?? undefined}>
          Hold it
        </Button>
      </div>
      {letters.length > 0 && (
        <div className="grid grid-cols-[repeat(auto-fill,minmax(56px,1fr))] gap-2">
          {letters.map((letter) => (
            <Key key={letter} onPress={() => press(letter)}>
              {letter}
            </Key>
          ))}
        </div>
      )}
      <div className="grid grid-cols-4 gap-2">
        <div className="col-span-3 grid grid-cols-3 gap-2">
          {ROWS.flat().map((digit) => (
            <Key key={digit} onPress={() => press(digit)}>
              {digit}
            </Key>
          ))}
          <Key onPress={() => onChange('')} name="Clear" className="text-lg">
            clear
          </Key>
          <Key onPress={() => press('0')}>0</Key>
          <Key onPress={() => onChange(value.slice(0, -1))} name="Take back the last digit">
            ⌫
          </Key>
        </div>
        <Button type="submit" disabled={value.trim() === ''} className="text-2xl">
          Ask
        </Button>
      </div>
    </form>
  )
}
