'use client'

/** The pit exit's screens. */
export function PitExitApp() {
  return (
    <main className="p-4">
      <h1 className="text-2xl">Pit exit</h1>
    </main>
  )
}
