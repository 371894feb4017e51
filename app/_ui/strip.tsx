import type { ReactNode } from 'react'
import { classNames } from './class-names'

export interface StripProps {
  /** The machine's own state: “offline since 07:12 · 14 to send”. */
  readonly children: ReactNode
  /** The clock, at the other end. */
  readonly end?: ReactNode
  /** Loud only when a person is needed. */
  readonly isLoud?: boolean
}

/** One quiet line about the machine itself. Offline is a state, not an error. */
export function Strip({ children, end, isLoud = false }: StripProps) {
  return (
    <div
      data-slot="strip"
      role="status"
      className={classNames(
        'flex min-h-10 items-center justify-between gap-4 border-b px-4 py-1.5',
        isLoud ? 'bg-ink font-bold text-ground' : 'text-muted',
      )}
    >
      <span className="min-w-0">{children}</span>
      {end !== undefined && <span className="shrink-0 tabular-nums">{end}</span>}
    </div>
  )
}
