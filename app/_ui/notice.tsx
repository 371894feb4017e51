import type { ReactNode } from 'react'
import { classNames } from './class-names'

export interface NoticeProps {
  /** What happened, in one sentence. */
  readonly happened: ReactNode
  /** What was kept, or that nothing was changed. */
  readonly kept?: ReactNode
  /** What to do now. */
  readonly todo?: ReactNode
  /** Buttons or links for it. */
  readonly actions?: ReactNode
  /** `problem` is read out at once; `news` when there is time. An error is not an outcome, so it has no outcome's colour. */
  readonly weight?: 'problem' | 'news'
  readonly className?: string
}

/** Something a person must know: what happened, what was kept, what to do. */
export function Notice({ happened, kept, todo, actions, weight = 'problem', className }: NoticeProps) {
  const isProblem = weight === 'problem'
  return (
    <div
      data-slot="notice"
      role={isProblem ? 'alert' : 'status'}
      className={classNames('border-l-8 bg-surface p-4', isProblem ? 'border-line' : 'border-accent', className)}
    >
      <p className="font-bold">{happened}</p>
      {kept !== undefined && <p className="mt-1">{kept}</p>}
      {todo !== undefined && <p className="mt-1">{todo}</p>}
      {actions !== undefined && <div className="mt-3 flex flex-wrap gap-3">{actions}</div>}
    </div>
  )
}
