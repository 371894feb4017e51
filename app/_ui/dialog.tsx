'use client'

import { type ReactNode, useEffect, useId, useRef } from 'react'
import { classNames } from './class-names'

export interface DialogProps {
  readonly isOpen: boolean
  /** Escape, or a press beside it where `closesOutside`. */
  readonly onClose: () => void
  readonly title: string
  readonly children: ReactNode
  /** What can be done; the safe one first. */
  readonly actions?: ReactNode
  /** `dialog` stands in the middle; `sheet` rises from the lower edge, where thumbs are. */
  readonly from?: 'middle' | 'below'
  readonly closesOutside?: boolean
}

/** A question that must be answered before going on. The browser's own dialog: it holds the focus and gives it back. */
export function Dialog({ isOpen, onClose, title, children, actions, from = 'middle', closesOutside = false }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null)
  const titleId = useId()
  useEffect(() => {
    const element = dialog.current
    if (element === null) return
    if (isOpen && !element.open) element.showModal()
    if (!isOpen && element.open) element.close()
  }, [isOpen])

  return (
    <dialog
      ref={dialog}
      data-slot={from === 'below' ? 'sheet' : 'dialog'}
      aria-labelledby={titleId}
      onCancel={(event) => {
        // The caller decides: it holds whether it is open.
        event.preventDefault()
        onClose()
      }}
      onClick={(event) => {
        if (closesOutside && event.target === dialog.current) onClose()
      }}
      className={classNames(
        'border-[3px] border-line bg-ground text-ink backdrop:bg-[color-mix(in_srgb,var(--line)_70%,transparent)]',
        from === 'below'
          ? 'mx-auto mt-auto mb-0 max-h-[90dvh] w-full max-w-[720px] overflow-y-auto border-b-0'
          : 'm-auto max-h-[90dvh] w-[min(560px,calc(100vw-32px))] overflow-y-auto rounded-sm',
      )}
    >
      {isOpen && (
        <div className="grid gap-4 p-5">
          <h2 id={titleId} className="text-2xl">
            {title}
          </h2>
          <div>{children}</div>
          {actions !== undefined && <div className="flex flex-wrap justify-end gap-3">{actions}</div>}
        </div>
      )}
    </dialog>
  )
}
