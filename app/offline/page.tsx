import type { Metadata } from 'next'
import { connection } from 'next/server'
import { buttonClass } from '@/app/_ui/button'
import { HardLink } from '@/app/_ui/hard-link'
import { TryAgain } from './try-again'

export const metadata: Metadata = { title: 'No network' }

/** What the worker answers with where a page needs the network and there is none. The same for everybody, like the crew's shells. */
export default async function OfflinePage() {
  await connection() // rendered per request: the policy's nonce is new each time
  return (
    <main className="mx-auto max-w-[720px] p-4">
      <h1 className="text-3xl">This page needs the network</h1>
      <p className="mt-4">
        The server cannot be reached from here. Nothing was lost: what this device recorded waits on it and is sent later.
      </p>
      <p className="mt-4">These work without it, once the day is loaded:</p>
      <nav aria-label="What works offline" className="mt-4 flex flex-wrap gap-4">
        <HardLink className={buttonClass('primary')} href="/bay">
          Bay
        </HardLink>
        <HardLink className={buttonClass('primary')} href="/pit-exit">
          Pit exit
        </HardLink>
        <HardLink className={buttonClass('primary')} href="/sign-on">
          Sign-on
        </HardLink>
        <TryAgain />
      </nav>
    </main>
  )
}
