import type { Metadata } from 'next'
import type { ReactNode } from 'react'

export const metadata: Metadata = { title: 'Pit exit' }

export default function PitExitLayout({ children }: { readonly children: ReactNode }) {
  return children
}
