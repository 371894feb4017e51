import type { ComponentProps, ReactNode } from 'react'
import { classNames } from './class-names'
import { OutcomeShape, type OutcomeState } from './outcome-shape'

type PressableState = Extract<OutcomeState, 'ok' | 'advisory' | 'fail' | 'ask'>

const FILLS: Readonly<Record<PressableState, string>> = {
  ok: 'border-ok bg-ok text-ok-ink active:bg-ground active:text-ok',
  advisory: 'border-advisory bg-advisory text-advisory-ink active:bg-ground active:text-ink',
  fail: 'border-fail bg-fail text-fail-ink active:bg-ground active:text-fail',
  ask: 'border-ask bg-ask text-ask-ink active:bg-ground active:text-ask',
}

export interface OutcomeButtonProps extends ComponentProps<'button'> {
  readonly state: PressableState
  /** What is seen, in words: “3 mm or more”, never “ok”. */
  readonly children: ReactNode
  /** `filled`: the two answers of a check; `outlined`: the others (could not see, put right here). */
  readonly look?: 'filled' | 'outlined'
}

/** Records an outcome: at least 96 px high, shape before word before colour. */
export function OutcomeButton({ state, look = 'filled', className, children, type = 'button', ...rest }: OutcomeButtonProps) {
  const isFilled = look === 'filled'
  return (
    <button
      data-slot="outcome-button"
      data-state={state}
      type={type}
      className={classNames(
        'target-outcome inline-flex items-center justify-center gap-x-3 gap-y-1.5 max-sm:flex-col max-sm:items-start rounded-sm border-[3px] px-3 py-2 text-left text-xl font-bold wrap-anywhere',
        'group disabled:cursor-not-allowed disabled:border-dashed disabled:border-muted disabled:bg-ground disabled:text-muted',
        isFilled ? FILLS[state] : 'border-line bg-ground text-ink active:bg-surface',
        className,
      )}
      {...rest}
    >
      {isFilled ? (
        <>
          <OutcomeShape state={state} tone="inverse" className="size-8 group-active:hidden group-disabled:hidden" />
          <OutcomeShape state={state} className="hidden size-8 group-active:block group-disabled:block" />
        </>
      ) : (
        <OutcomeShape state={state} className="size-8" />
      )}
      <span>{children}</span>
    </button>
  )
}

/** Two opposite answers: never change sides, and stand 48 px or more apart so that one is not pressed for the other. */
export function OutcomePair({ left, right }: { readonly left: ReactNode; readonly right: ReactNode }) {
  return (
    <div data-slot="outcome-pair" className="grid grid-cols-2 gap-x-12 *:w-full">
      {left}
      {right}
    </div>
  )
}
