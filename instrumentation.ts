/** Before the first request: bring the database up to date and refuse to serve from one that could lose or change a record. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return
  const { prepareServer } = await import('./db/prepare-server')
  prepareServer()
}
