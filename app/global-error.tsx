'use client'

import './globals.css'
import ErrorPage, { type ErrorPageProps } from './error'

/** When the frame around every page itself broke: it brings its own document. */
export default function GlobalError(props: ErrorPageProps) {
  return (
    <html lang="en">
      <body>
        <ErrorPage {...props} />
      </body>
    </html>
  )
}
