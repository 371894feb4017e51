'use client'

/** The bay's screens. */
export function BayApp() {
  return (
    <main className="p-4">
      <h1 className="text-2xl">Bay</h1>
    </main>
  )
}
