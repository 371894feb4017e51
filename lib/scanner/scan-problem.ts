import type { ScanProblem, ScanProblemCode } from './port'

const KEPT = 'Numbers and typed codes still work.'

const WORDS: Readonly<Record<ScanProblemCode, Omit<ScanProblem, 'code'>>> = {
  insecure: {
    happened: 'This page may not use the camera, because it was not opened over https.',
    kept: KEPT,
    todo: 'Open the https address of the event, or type the number.',
  },
  'no-camera': {
    happened: 'This device has no camera that can be used.',
    kept: KEPT,
    todo: 'Type the number or the code under the sticker.',
  },
  refused: {
    happened: 'The browser was told not to let this page use the camera.',
    kept: KEPT,
    todo: 'Allow the camera for this page in the browser’s settings, then open the scanner again.',
  },
  busy: {
    happened: 'The camera did not start; another app may be using it.',
    kept: KEPT,
    todo: 'Close other apps that use the camera, then open the scanner again.',
  },
  decoder: {
    happened: 'The part that reads codes could not be loaded.',
    kept: KEPT,
    todo: 'Type the number. Reload this page once where there is network.',
  },
}

/** A problem of the scanner in words. */
export function scanProblem(code: ScanProblemCode): ScanProblem {
  return { code, ...WORDS[code] }
}
