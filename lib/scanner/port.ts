/** Why there are no codes from the camera. */
export type ScanProblemCode = 'insecure' | 'no-camera' | 'refused' | 'busy' | 'decoder'

/** In words for the person who holds the phone: what happened, what still works, what to do. */
export interface ScanProblem {
  readonly code: ScanProblemCode
  readonly happened: string
  readonly kept: string
  readonly todo: string
}

export interface ScanControls {
  /** Turns the lamp on or off; null where this camera has none. */
  readonly setTorch: ((isOn: boolean) => Promise<void>) | null
}

/**
 * Opens the camera inside `host` and tells each code it reads. What is read is hostile text: parse it, never open it.
 * A code held in view is told once, and again only after two seconds without it. Ends with the returned function, which may be called
 * at any moment (also while the camera still opens) and resolves when the camera is free. Problems are told, never thrown.
 */
export type StartScanner = (
  host: HTMLElement,
  onText: (text: string) => void,
  onProblem: (problem: ScanProblem) => void,
  onReady?: (controls: ScanControls) => void,
) => () => Promise<void>
