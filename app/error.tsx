'use client'

import { useEffect } from 'react'
import { Button } from './_ui/button'
import { Notice } from './_ui/notice'

export interface ErrorPageProps {
  readonly error: Error & { readonly digest?: string }
  readonly reset: () => void
}

export default function ErrorPage({ error, reset }: ErrorPageProps) {
  useEffect(() => console.error(error), [error]) // eslint-disable-line no-console -- the only trace of a fault in a browser nobody watches
  return (
    <main className="mx-auto max-w-[720px] p-4">
      <h1 className="mb-4 text-2xl">This page broke</h1>
      <Notice
        happened="Something in the page went wrong; it is our fault, not yours."
        kept="What was recorded before stays recorded on this device."
        todo={
          error.digest === undefined
            ? 'Try again, or reload the page.'
            : `Try again. If it happens twice, tell the organiser this number: ${error.digest}.`
        }
        actions={<Button onClick={reset}>Try again</Button>}
      />
    </main>
  )
}
