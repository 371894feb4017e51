import type { MeasureField } from '@/lib/checklist/checklist'
import { Button } from '@/app/_ui/button'
import { Keypad } from '@/app/_ui/keypad'

type NumberMeasure = Extract<MeasureField, { kind: 'number' }>

interface NumberFieldProps {
  readonly field: NumberMeasure
  readonly value: string
  readonly onPick: () => void
}

/** A number as it stands; a press opens its keypad. */
export function NumberField({ field, value, onPick }: NumberFieldProps) {
  return (
    <button
      type="button"
      onClick={onPick}
      className="target flex w-full items-baseline gap-3 rounded-sm border border-line px-3 py-2 text-left"
    >
      <span className="grow">{field.label}</span>
      <span className="figures text-4xl">{value === '' ? '–' : value}</span>
      <span className="text-muted">{field.unit}</span>
    </button>
  )
}

interface ActiveNumberProps {
  readonly field: NumberMeasure
  readonly value: string
  /** What the value means, said at each keystroke. */
  readonly says: string
  readonly isLast: boolean
  readonly onChange: (value: string) => void
  readonly onNext: () => void
}

/** The number that is being keyed, judged at each keystroke with the figure that decided. */
export function ActiveNumber({ field, value, says, isLast, onChange, onNext }: ActiveNumberProps) {
  return (
    <div className="grid gap-2 border-l-4 border-accent pl-3">
      <p aria-hidden="true">{field.label}</p>
      <Keypad
        label={field.label}
        value={value}
        unit={field.unit}
        allowsDecimal={field.decimals > 0}
        allowsNegative={field.min < 0}
        onChange={onChange}
        judgement={says}
      />
      <Button look="secondary" onClick={onNext}>
        {isLast ? 'Done' : 'Next value'}
      </Button>
    </div>
  )
}
