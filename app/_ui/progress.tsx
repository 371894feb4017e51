import { classNames } from './class-names'

export interface ProgressProps {
  /** What is being done: “Loading the day”. */
  readonly label: string
  readonly done: number
  /** Null while the whole is not known: then only the count is shown, never a made-up bar. */
  readonly total: number | null
  /** What is counted: “entries”. */
  readonly unit: string
  readonly className?: string
}

/** Long work with its real counts. */
export function Progress({ label, done, total, unit, className }: ProgressProps) {
  const counts = total === null ? `${done} ${unit}` : `${done} of ${total} ${unit}`
  return (
    <div data-slot="progress" className={classNames('grid gap-1.5', className)}>
      <p className="flex justify-between gap-4">
        <span className="font-bold">{label}</span>
        <span className="tabular-nums">{counts}</span>
      </p>
      {total !== null && (
        <progress
          aria-label={`${label}: ${counts}`}
          value={done}
          max={Math.max(total, 1)}
          className="h-4 w-full appearance-none border-2 border-line bg-ground [&::-moz-progress-bar]:bg-accent [&::-webkit-progress-bar]:bg-ground [&::-webkit-progress-value]:bg-accent"
        />
      )}
    </div>
  )
}
