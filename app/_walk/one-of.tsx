interface OneOfProps<T extends string | number | boolean> {
  readonly name: string
  readonly label: string
  readonly options: readonly { readonly value: T; readonly label: string }[]
  /** Undefined until somebody has chosen: nothing is chosen beforehand. */
  readonly value: T | undefined
  readonly onPick: (value: T) => void
  readonly isStrong?: boolean
}

/** One of a few, each a press of its own. */
export function OneOf<T extends string | number | boolean>({ name, label, options, value, onPick, isStrong = false }: OneOfProps<T>) {
  return (
    <fieldset>
      <legend className={isStrong ? 'font-bold' : undefined}>{label}</legend>
      <div className="mt-1 flex flex-wrap gap-2">
        {options.map((option) => (
          <label
            key={String(option.value)}
            className="target flex items-center gap-2 rounded-sm border border-line px-3 py-2 has-checked:border-accent has-checked:bg-accent has-checked:text-accent-ink has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-accent"
          >
            <input
              type="radio"
              className="size-5 accent-current"
              name={name}
              checked={value === option.value}
              onChange={() => onPick(option.value)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  )
}
