import type { ComponentProps, ReactNode } from 'react'
import { classNames } from './class-names'

export interface DataTableProps extends ComponentProps<'table'> {
  /** What the table lists; read out, and shown above it. */
  readonly caption: ReactNode
}

/** A table that scrolls sideways by itself on a narrow screen. Give it `thead` and `tbody` of `Th` and `Td`. */
export function DataTable({ caption, className, children, ...rest }: DataTableProps) {
  return (
    // A region that scrolls must be reachable by keyboard.
    <div
      data-slot="data-table"
      className="overflow-x-auto"
      tabIndex={0}
      role="region"
      aria-label={typeof caption === 'string' ? caption : undefined}
    >
      <table className={classNames('w-full border-collapse text-left', className)} {...rest}>
        <caption className="pb-2 text-left font-bold">{caption}</caption>
        {children}
      </table>
    </div>
  )
}

/** A head of a column, or of a row with `scope="row"`. */
export function Th({ className, scope = 'col', ...rest }: ComponentProps<'th'>) {
  const look =
    scope === 'row' ? 'border-b py-2 align-top font-bold' : 'border-b-[3px] bg-surface px-2 py-2 font-bold whitespace-nowrap first:pl-3'
  return <th scope={scope} className={classNames(look, scope === 'row' && 'px-2 first:pl-3', className)} {...rest} />
}

/** A cell; `isNumber` sets figures under one another. */
export function Td({ isNumber = false, className, ...rest }: ComponentProps<'td'> & { readonly isNumber?: boolean }) {
  return <td className={classNames('border-b px-2 py-2 align-top', isNumber && 'text-right tabular-nums', className)} {...rest} />
}
