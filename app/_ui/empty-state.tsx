import type { ReactNode } from 'react'
import { hexagonPoints } from './wire-geometry'

export interface EmptyStateProps {
  /** What is not there yet. */
  readonly title: string
  /** What to do next. */
  readonly children: ReactNode
  readonly actions?: ReactNode
}

/** Nothing here yet, and what to do about it. */
export function EmptyState({ title, children, actions }: EmptyStateProps) {
  return (
    <div data-slot="empty-state" className="grid justify-items-start gap-3 border-2 border-dashed border-muted p-6">
      <svg viewBox="-13 -13 70 26" className="h-7 w-[70px]" aria-hidden>
        {[0, 44].map((x) => (
          <g key={x}>
            <polygon points={hexagonPoints(x, 0, 12)} strokeWidth="1.8" className="fill-none stroke-muted" />
            <circle cx={x} r="2.4" strokeWidth="1.8" className="fill-none stroke-muted" />
          </g>
        ))}
      </svg>
      <h2 className="text-xl">{title}</h2>
      <div>{children}</div>
      {actions !== undefined && <div className="flex flex-wrap gap-3">{actions}</div>}
    </div>
  )
}
