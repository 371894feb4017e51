import type { Metadata } from 'next'
import type { ReactNode } from 'react'

export const metadata: Metadata = { title: 'Sign-on' }

export default function SignOnLayout({ children }: { readonly children: ReactNode }) {
  return children
}
