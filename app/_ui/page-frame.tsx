import type { ReactNode } from 'react'
import { classNames } from './class-names'

export interface PageFrameProps {
  readonly title: string
  /** A line under the title: which event, which day. */
  readonly subtitle?: ReactNode
  /** What leads elsewhere, on the first line. */
  readonly navigation?: ReactNode
  /** What can be done on this page, beside the title. */
  readonly actions?: ReactNode
  readonly width?: 'text' | 'wide' | 'full'
  readonly children: ReactNode
}

const WIDTHS = { text: 'max-w-[720px]', wide: 'max-w-[1240px]', full: '' } as const

/** An office page: one heading, what can be done, the content. */
export function PageFrame({ title, subtitle, navigation, actions, width = 'wide', children }: PageFrameProps) {
  return (
    <div data-slot="page-frame" className={classNames('mx-auto flex min-h-dvh w-full flex-col px-4 pb-12 sm:px-6', WIDTHS[width])}>
      <a href="#content" className="sr-only bg-ground p-2 focus:not-sr-only focus:absolute focus:z-10">
        Skip to the content
      </a>
      <header className="border-b py-3">{navigation}</header>
      <main id="content" className="grow">
        <div className="flex flex-wrap items-end justify-between gap-4 pt-6 pb-4">
          <div>
            <h1 className="text-3xl">{title}</h1>
            {subtitle !== undefined && <p className="mt-1 text-muted">{subtitle}</p>}
          </div>
          {actions !== undefined && <div className="flex flex-wrap gap-3">{actions}</div>}
        </div>
        {children}
      </main>
    </div>
  )
}
