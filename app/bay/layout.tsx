import type { Metadata } from 'next'
import type { ReactNode } from 'react'

export const metadata: Metadata = { title: 'Bay' }

export default function BayLayout({ children }: { readonly children: ReactNode }) {
  return children
}
