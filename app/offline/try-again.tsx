'use client'

import { Button } from '@/app/_ui/button'

/** Asks for the address again that the network did not answer. */
export function TryAgain() {
  return (
    <Button look="secondary" onClick={() => location.reload()}>
      Try again
    </Button>
  )
}
