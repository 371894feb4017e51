import './globals.css'
import type { Metadata, Viewport } from 'next'
import { headers } from 'next/headers'
import type { ReactNode } from 'react'
import { fontVariables } from './_ui/fonts/fonts'
import { ServiceWorker } from './_ui/service-worker'

export const metadata: Metadata = {
  title: { default: 'Lockwire', template: '%s · Lockwire' },
  description: 'Scrutineering and sign-on for track days: what was seen, by whom, on what grounds, and who may leave the pit lane.',
  applicationName: 'Lockwire',
  appleWebApp: { capable: true, title: 'Lockwire', statusBarStyle: 'default' },
  icons: { icon: { url: '/icons/icon.svg', type: 'image/svg+xml' }, apple: '/icons/icon-apple-180.png' },
  formatDetection: { telephone: false, date: false, email: false, address: false },
}

export const viewport: Viewport = { width: 'device-width', initialScale: 1, viewportFit: 'cover', themeColor: '#ffffff' }

export default async function RootLayout({ children }: { readonly children: ReactNode }) {
  const nonce = (await headers()).get('x-nonce') ?? undefined
  return (
    // theme.js sets data-theme before React wakes, and browsers hide a nonce once read: neither is a mismatch.
    <html lang="en" className={fontVariables} suppressHydrationWarning>
      <head>
        {/* eslint-disable-next-line @next/next/no-sync-scripts -- it must run before the first paint, and an inline script is refused by the policy */}
        <script src="/theme.js" nonce={nonce} suppressHydrationWarning />
      </head>
      <body>
        {children}
        <ServiceWorker />
      </body>
    </html>
  )
}
