/** Before the first request: bring the database up to date, refuse to serve from one that could lose or change a record, and begin to send mail. */
export async function register(): Promise<void> {
  // Inside the condition, not after an early return: only so does the build leave it out of other runtimes.
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { prepareServer } = await import('./db/prepare-server')
    prepareServer()
    const [{ env }, { mailReaders }, { startServedMailLoop }] = await Promise.all([
      import('./lib/platform/env'),
      import('./app/_mail/mail-readers'),
      import('./lib/mail/served-mail-loop'),
    ])
    startServedMailLoop(env().origin, mailReaders.preChecks)
  }
}
