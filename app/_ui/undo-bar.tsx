import { Button } from './button'

export interface UndoBarProps {
  /** What was just done: “Front left: thinner pad 2.6 mm, fail”. Nothing is shown where there is nothing. */
  readonly done: string | null
  readonly onUndo?: () => void
}

/** What was just recorded, and a way back, in place of a question beforehand. It stays until the next thing is done. */
export function UndoBar({ done, onUndo }: UndoBarProps) {
  return (
    <div data-slot="undo-bar" role="status" className="min-h-12">
      {done !== null && (
        <div className="flex items-center justify-between gap-3 bg-surface pl-3">
          <span className="min-w-0 py-1 wrap-anywhere">{done}</span>
          {onUndo && (
            <Button look="quiet" onClick={onUndo}>
              Undo
            </Button>
          )}
        </div>
      )}
    </div>
  )
}
