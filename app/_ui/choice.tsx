import type { ComponentProps, ReactNode } from 'react'
import { classNames } from './class-names'

export interface ChoiceProps extends Omit<ComponentProps<'input'>, 'children'> {
  readonly type?: 'checkbox' | 'radio'
  readonly children: ReactNode
}

/** A box or a dot with its words; the whole line can be pressed. */
export function Choice({ type = 'checkbox', className, children, ...rest }: ChoiceProps) {
  return (
    <label
      data-slot="choice"
      className={classNames('target flex cursor-pointer items-center gap-3 py-1 has-disabled:text-muted', className)}
    >
      <input type={type} className="choice-mark" {...rest} />
      <span>{children}</span>
    </label>
  )
}
