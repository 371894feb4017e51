import { dirname, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'

/** The project's folder, wherever it was cloned to. */
export const root = resolve(dirname(fileURLToPath(import.meta.url)), '../..')

/** A path inside the project. */
export function inRoot(...parts) {
  return resolve(root, ...parts)
}
