import type { ReactNode } from 'react'

/** A part of the design page with its heading. */
export function Sample({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <section data-sample={title} className="grid min-w-0 gap-4 *:min-w-0">
      <h2 className="border-b-[3px] pb-1 text-2xl">{title}</h2>
      {children}
    </section>
  )
}
