import { clockTime } from '@/app/_crew/say-when'
import { Notice } from '@/app/_ui/notice'
import { type Connection, POLL_SECONDS } from '@/lib/board/use-board'
import type { Board } from '@/lib/contracts/board'

/** How fresh the board is, in one quiet line; loud only when what is shown is no longer fresh. */
export function ConnectionLine({ connection, board: { at, timeZone, seq } }: { readonly connection: Connection; readonly board: Board }) {
  const clock = clockTime(at, timeZone)
  if (connection.state === 'lost') {
    const { code, todo } = connection.problem
    if (code === 'not-signed-in')
      return <Notice happened="Your sign-in is over." kept={`What you see is from ${clock}.`} todo={<a href="/sign-in">Sign in again</a>} />
    const isOffline = code === 'no-network' || code === 'not-our-server'
    return (
      <Notice
        happened={
          isOffline
            ? `No connection since ${clock}; what you see is from then.`
            : `${connection.problem.what} What you see is from ${clock}.`
        }
        todo={isOffline ? 'It is tried again by itself.' : todo}
      />
    )
  }
  return (
    <p className="text-muted">
      <span role="status">{connection.state === 'live' ? 'Live' : `Checking every ${POLL_SECONDS} s`}</span>
      {` · as at ${clock} at the venue · ${seq === 0 ? 'no records yet' : seq === 1 ? '1 record' : `${seq} records`}`}
    </p>
  )
}
