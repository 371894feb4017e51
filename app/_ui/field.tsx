'use client'

import { type ComponentProps, type ReactNode, useId } from 'react'
import { classNames } from './class-names'

/** What a control needs to belong to its label, its description and its error. Spread it on the control. */
export interface FieldControl {
  readonly id: string
  readonly 'aria-describedby': string | undefined
  readonly 'aria-invalid': true | undefined
  readonly className: string
}

export interface FieldProps {
  readonly label: ReactNode
  readonly description?: ReactNode | undefined
  /** What is wrong with what was typed, and how to mend it. */
  readonly error?: string | undefined
  readonly isOptional?: boolean
  readonly className?: string
  /** Draws the control. What was typed is never cleared by an error. */
  readonly children: (control: FieldControl) => ReactNode
}

/** Label, description and error of one control, wired once. */
export function Field({ label, description, error, isOptional = false, className, children }: FieldProps) {
  const id = useId()
  const described = [description !== undefined && `${id}-description`, error !== undefined && `${id}-error`].filter(Boolean).join(' ')
  return (
    <div data-slot="field" className={classNames('grid gap-1.5', className)}>
      <label htmlFor={id} className="font-bold">
        {label}
        {isOptional && <span className="font-normal text-muted"> (optional)</span>}
      </label>
      {description !== undefined && (
        <p id={`${id}-description`} className="text-muted">
          {description}
        </p>
      )}
      {children({
        id,
        'aria-describedby': described === '' ? undefined : described,
        'aria-invalid': error === undefined ? undefined : true,
        className: CONTROL,
      })}
      <p id={`${id}-error`} role="alert" className={classNames('font-bold', error !== undefined && 'border-l-8 border-line pl-3')}>
        {error}
      </p>
    </div>
  )
}

const CONTROL =
  'w-full min-h-12 rounded-sm border-2 border-line bg-ground px-3 py-2 text-ink placeholder:text-muted aria-invalid:border-[4px] disabled:border-dashed disabled:border-muted disabled:text-muted'

type FieldWords = Omit<FieldProps, 'children' | 'className'>

/** A line of text with its label; spread react-hook-form's `register(name)` on it. */
export function TextField({
  label,
  description,
  error,
  isOptional,
  className,
  ...rest
}: FieldWords & Omit<ComponentProps<'input'>, keyof FieldWords>) {
  return (
    <Field label={label} description={description} error={error} isOptional={isOptional ?? false}>
      {(control) => <input data-slot="input" type="text" {...rest} {...control} className={classNames(control.className, className)} />}
    </Field>
  )
}

/** Several lines of text with their label. */
export function TextAreaField({
  label,
  description,
  error,
  isOptional,
  className,
  ...rest
}: FieldWords & Omit<ComponentProps<'textarea'>, keyof FieldWords>) {
  return (
    <Field label={label} description={description} error={error} isOptional={isOptional ?? false}>
      {(control) => <textarea data-slot="textarea" rows={3} {...rest} {...control} className={classNames(control.className, className)} />}
    </Field>
  )
}

/** One of a list, with its label. */
export function SelectField({
  label,
  description,
  error,
  isOptional,
  className,
  ...rest
}: FieldWords & Omit<ComponentProps<'select'>, keyof FieldWords>) {
  return (
    <Field label={label} description={description} error={error} isOptional={isOptional ?? false}>
      {(control) => <select data-slot="select" {...rest} {...control} className={classNames(control.className, className)} />}
    </Field>
  )
}
