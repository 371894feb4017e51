import type { ScanProblem, StartScanner } from '@/lib/scanner/port'

/** The camera of the tests: it reads what it is shown. */
export const camera = {
  shows: (_text: string): void => undefined,
  fails: (_problem: ScanProblem): void => undefined,
}

/** Stands in for the real scanner, which needs a browser with a camera. */
export const fakeScanner: StartScanner = (_host, onText, onProblem, onReady) => {
  camera.shows = onText
  camera.fails = onProblem
  onReady?.({ setTorch: null })
  return () => Promise.resolve()
}
