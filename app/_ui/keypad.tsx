'use client'

import { useId, type ReactNode } from 'react'
import { classNames } from './class-names'

export interface KeypadProps {
  /** What is measured: “Thinner pad, front left”. */
  readonly label: string
  /** What has been typed so far, as typed. */
  readonly value: string
  readonly onChange: (value: string) => void
  readonly unit: string
  /** The limit in words with its unit: “limit 3.0 mm”. */
  readonly limit?: ReactNode
  /** What the value means, judged at each keystroke: “0.4 mm under the limit”. */
  readonly judgement?: ReactNode
  readonly allowsDecimal?: boolean
  readonly allowsNegative?: boolean
  readonly maxLength?: number
}

const DIGITS = ['1', '2', '3', '4', '5', '6', '7', '8', '9']

/** A number pad for gloves, with the unit on it and the limit beside it. Keyboards type into the same value. */
export function Keypad(props: KeypadProps) {
  const { label, value, onChange, unit, limit, judgement, allowsDecimal = true, allowsNegative = false } = props
  const id = useId()
  const press = (key: string) => onChange(typed(value, key, props))
  return (
    <div data-slot="keypad" className="grid gap-3">
      <label htmlFor={id} className="sr-only">
        {`${label}, ${unit}`}
      </label>
      <div className="flex flex-wrap items-baseline gap-x-3">
        <input
          id={id}
          inputMode="none"
          autoComplete="off"
          aria-describedby={`${id}-means`}
          value={value}
          onChange={({ target }) => onChange(cleaned(target.value, props))}
          className="figures w-[5ch] min-w-0 border-b-[3px] bg-ground text-5xl"
        />
        <span className="text-xl">{unit}</span>
        {limit !== undefined && <span className="text-muted">{limit}</span>}
      </div>
      <p id={`${id}-means`} aria-live="polite" className="min-h-6 font-bold">
        {judgement}
      </p>
      <div className="grid grid-cols-3 gap-2">
        {DIGITS.map((digit) => (
          <Key key={digit} onPress={() => press(digit)}>
            {digit}
          </Key>
        ))}
        {allowsDecimal ? (
          <Key onPress={() => press('.')} name="Decimal point">
            .
          </Key>
        ) : (
          <Key onPress={() => onChange('')} name="Clear">
            clear
          </Key>
        )}
        <Key onPress={() => press('0')}>0</Key>
        <Key onPress={() => onChange(value.slice(0, -1))} name="Take back the last digit">
          ⌫
        </Key>
        {allowsNegative && (
          <Key onPress={() => onChange(value.startsWith('-') ? value.slice(1) : `-${value}`)} name="Change the sign" className="col-span-3">
            + / −
          </Key>
        )}
      </div>
    </div>
  )
}

export interface KeyProps {
  readonly children: ReactNode
  readonly onPress: () => void
  /** What it does, where its face does not say it. */
  readonly name?: string
  readonly className?: string
}

/** One key, wide enough for a glove. */
export function Key({ children, onPress, name, className }: KeyProps) {
  return (
    <button
      data-slot="key"
      type="button"
      aria-label={name}
      onClick={onPress}
      className={classNames(
        'heading min-h-14 rounded-sm border-2 border-line bg-surface text-2xl active:bg-ink active:text-ground',
        className,
      )}
    >
      {children}
    </button>
  )
}

type Shape = Pick<KeypadProps, 'allowsDecimal' | 'allowsNegative' | 'maxLength'>

function typed(value: string, key: string, shape: Shape): string {
  if (key === '.' && (value === '' || value === '-')) return cleaned(`${value}0.`, shape)
  return cleaned(value + key, shape)
}

/** Keeps what a number may hold: digits, one point (a comma is one), a leading minus where asked. What would make it too long is not taken. */
function cleaned(text: string, { allowsDecimal = true, allowsNegative = false, maxLength = 6 }: Shape): string {
  const minus = allowsNegative && /^\s*[-−]/.test(text) ? '-' : ''
  const [whole = '', ...rest] = text
    .replace(/,/g, '.')
    .replace(/[^\d.]/g, '')
    .split('.')
  const number = allowsDecimal && rest.length > 0 ? `${whole}.${rest.join('')}` : whole + rest.join('')
  return minus + number.slice(0, maxLength)
}
