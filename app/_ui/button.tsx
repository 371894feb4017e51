import type { ComponentProps } from 'react'
import { classNames } from './class-names'

export type ButtonLook = 'primary' | 'secondary' | 'quiet'
export type ButtonSize = 'normal' | 'large'

const LOOKS: Readonly<Record<ButtonLook, string>> = {
  primary: 'border-2 border-accent bg-accent text-accent-ink active:bg-ground active:text-accent',
  secondary: 'border-2 border-line bg-ground text-ink active:bg-ink active:text-ground',
  quiet: 'border-2 border-transparent text-accent underline underline-offset-4 active:border-accent',
}

const SIZES: Readonly<Record<ButtonSize, string>> = {
  normal: 'target px-4 py-2',
  large: 'target-outcome px-6 py-4 text-xl',
}

export interface ButtonProps extends ComponentProps<'button'> {
  readonly look?: ButtonLook
  /** `large`: for gloved hands, 96 px and more. */
  readonly size?: ButtonSize
  /** Work goes on: it takes no second press, and says so. */
  readonly isBusy?: boolean
}

/** A button. `type` is `button` unless told otherwise. */
export function Button({ look = 'primary', size = 'normal', isBusy = false, className, disabled, type = 'button', ...rest }: ButtonProps) {
  return (
    <button
      data-slot="button"
      type={type}
      disabled={disabled === true || isBusy}
      aria-busy={isBusy || undefined}
      className={classNames(buttonClass(look, size), className)}
      {...rest}
    />
  )
}

/** The same look for a link that leads on like a button. */
export function buttonClass(look: ButtonLook = 'primary', size: ButtonSize = 'normal'): string {
  return classNames(
    'inline-flex items-center justify-center gap-2 rounded-sm text-center font-bold',
    'disabled:cursor-not-allowed disabled:border-dashed disabled:border-muted disabled:bg-ground disabled:text-muted',
    LOOKS[look],
    SIZES[size],
  )
}
