/** Before the first request: bring the database up to date and refuse to serve from one that could lose or change a record. */
export async function register(): Promise<void> {
  // Inside the condition, not after an early return: only so does the build leave it out of other runtimes.
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { prepareServer } = await import('./db/prepare-server')
    prepareServer()
  }
}
